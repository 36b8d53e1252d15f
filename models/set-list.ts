import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { SetEntry } from "./set-entry";

/** A named order of songs. */
export class SetListRow extends Model<InferAttributes<SetListRow, { omit: "entries" }>, InferCreationAttributes<SetListRow, { omit: "entries" }>> {
  declare id: string;
  declare rigId: string;
  declare name: string;
  declare position: number;
  declare revision: CreationOptional<number>;
  declare entries?: NonAttribute<SetEntry[]>;
}

export function initSetList(sequelize: Sequelize): void {
  SetListRow.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      rigId: { type: DataTypes.STRING(64), allowNull: false },
      name: { type: DataTypes.STRING(60), allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
    },
    { sequelize, tableName: "set_lists", timestamps: false, underscored: true },
  );
}
