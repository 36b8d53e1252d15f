import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** One drum rig: its gear, songs, sets and people hang from it. */
export class Rig extends Model<InferAttributes<Rig>, InferCreationAttributes<Rig>> {
  declare id: string;
  declare name: string;
  declare createdAt: Date;
}

export function initRig(sequelize: Sequelize): void {
  Rig.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      name: { type: DataTypes.STRING(60), allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, tableName: "rigs", timestamps: false, underscored: true },
  );
}
