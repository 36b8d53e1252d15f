import { z } from "zod";
import { nameSchema } from "./identity";

/** Passwords found first by anyone guessing (from memory, no source), of 12 characters or more; shorter ones fall to the length rule. */
const COMMON = new Set([
  "123456789012", "1234567890123", "password1234", "passwordpassword", "qwertyuiop12", "qwertyuiop123", "qwertyuiopasdf",
  "administrator", "letmeinletmein", "iloveyou1234", "iloveyouiloveyou", "111111111111", "000000000000", "abcdefghijkl",
  "abc123abc123", "welcome12345", "changeme1234", "changemechangeme", "drumdrumdrum", "drummerdrummer", "monkeymonkey", "football1234",
]);

export const emailSchema = z.string().trim().toLowerCase().max(254, "At most 254 characters.").pipe(z.email("That is not an e-mail address."));
export const passwordSchema = z
  .string()
  .min(12, "At least 12 characters.")
  .max(200, "At most 200 characters.")
  .refine((text) => !COMMON.has(text.toLowerCase()) && new Set(text).size > 3, { error: "That password is among the first anyone would guess." });

export const signUpSchema = z.strictObject({ name: nameSchema, email: emailSchema, password: passwordSchema }).meta({ id: "SignUp" });
export const signInSchema = z.strictObject({ email: emailSchema, password: z.string().min(1, "Type your password.").max(200) });
export type SignUpDraft = z.input<typeof signUpSchema>;
