import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { GearDetails, GearKind, Knob } from "@/lib/schemas/gear";
import type { JackRow } from "./jack";

/** A pad, conditioner, shaper, voice, desk channel or supply. Never deleted, only retired: old patches still name it. */
export class GearRow extends Model<InferAttributes<GearRow, { omit: "jacks" }>, InferCreationAttributes<GearRow, { omit: "jacks" }>> {
  declare id: string;
  declare rigId: string;
  declare kind: GearKind;
  declare name: string;
  declare notes: CreationOptional<string>;
  declare supplyId: string | null;
  declare details: GearDetails;
  declare knobs: Knob[];
  declare assumed: string[];
  declare position: number;
  declare retired: CreationOptional<boolean>;
  declare revision: CreationOptional<number>;
  declare jacks?: NonAttribute<JackRow[]>;
}

export function initGear(sequelize: Sequelize): void {
  GearRow.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      rigId: { type: DataTypes.STRING(64), allowNull: false },
      kind: { type: DataTypes.STRING(20), allowNull: false },
      name: { type: DataTypes.STRING(60), allowNull: false },
      notes: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      supplyId: { type: DataTypes.STRING(64), allowNull: true },
      details: { type: DataTypes.JSON, allowNull: false },
      knobs: { type: DataTypes.JSON, allowNull: false },
      assumed: { type: DataTypes.JSON, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      retired: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
    },
    { sequelize, tableName: "gear", timestamps: false, underscored: true },
  );
}
