import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { InputJack, JackRole, OutputJack } from "@/lib/schemas/jack";

/** An output or an input of a piece of gear, with its figures as one document. */
export class JackRow extends Model<InferAttributes<JackRow>, InferCreationAttributes<JackRow>> {
  declare id: string;
  declare gearId: string;
  declare direction: "output" | "input";
  declare name: string;
  declare connector: string;
  declare role: JackRole;
  declare position: number;
  declare figures: OutputJack["output"] | InputJack["input"];
}

export function initJack(sequelize: Sequelize): void {
  JackRow.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      gearId: { type: DataTypes.STRING(64), allowNull: false },
      direction: { type: DataTypes.STRING(6), allowNull: false },
      name: { type: DataTypes.STRING(60), allowNull: false },
      connector: { type: DataTypes.STRING(20), allowNull: false },
      role: { type: DataTypes.STRING(20), allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      figures: { type: DataTypes.JSON, allowNull: false },
    },
    { sequelize, tableName: "jacks", timestamps: false, underscored: true },
  );
}
