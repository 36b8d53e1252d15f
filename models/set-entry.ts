import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A song's place in a set. */
export class SetEntry extends Model<InferAttributes<SetEntry>, InferCreationAttributes<SetEntry>> {
  declare setId: string;
  declare songId: string;
  declare position: number;
}

export function initSetEntry(sequelize: Sequelize): void {
  SetEntry.init(
    {
      setId: { type: DataTypes.STRING(64), primaryKey: true },
      songId: { type: DataTypes.STRING(64), primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, tableName: "set_entries", timestamps: false, underscored: true },
  );
}
