import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { Role } from "@/lib/schemas/rig";
import type { User } from "./user";

/** A person's role in a rig. */
export class Membership extends Model<InferAttributes<Membership, { omit: "user" }>, InferCreationAttributes<Membership, { omit: "user" }>> {
  declare rigId: string;
  declare userId: string;
  declare role: Role;
  declare user?: NonAttribute<User>;
}

export function initMembership(sequelize: Sequelize): void {
  Membership.init(
    {
      rigId: { type: DataTypes.STRING(64), primaryKey: true },
      userId: { type: DataTypes.STRING(64), primaryKey: true },
      role: { type: DataTypes.STRING(20), allowNull: false },
    },
    { sequelize, tableName: "memberships", timestamps: false, underscored: true },
  );
}
