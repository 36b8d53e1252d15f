import { z } from "zod";
import { nameSchema } from "./identity";

export const ROLES = ["performer", "collaborator", "sound-helper"] as const;
export const roleSchema = z.enum(ROLES);
export type Role = (typeof ROLES)[number];

export const rigFieldsSchema = z.strictObject({ name: nameSchema }).meta({ id: "RigFields" });

export interface RigSummary {
  id: string;
  name: string;
  role: Role;
  gearCount: number;
  songCount: number;
}
export interface Member {
  userId: string;
  name: string;
  email: string;
  role: Role;
}
