import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A song; its patch is the revision of `patch_revisions` that `revision` names (0: none yet). */
export class SongRow extends Model<InferAttributes<SongRow>, InferCreationAttributes<SongRow>> {
  declare id: string;
  declare rigId: string;
  declare title: string;
  declare tempoBpm: number | null;
  declare notes: CreationOptional<string>;
  declare position: number;
  declare revision: CreationOptional<number>;
}

export function initSong(sequelize: Sequelize): void {
  SongRow.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      rigId: { type: DataTypes.STRING(64), allowNull: false },
      title: { type: DataTypes.STRING(60), allowNull: false },
      tempoBpm: { type: DataTypes.DOUBLE, allowNull: true },
      notes: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      position: { type: DataTypes.INTEGER, allowNull: false },
      revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    },
    { sequelize, tableName: "songs", timestamps: false, underscored: true },
  );
}
