import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Patch } from "@/lib/schemas/patch";

/** One saved state of a song's patch. Rows are added, never changed. */
export class PatchRevision extends Model<InferAttributes<PatchRevision>, InferCreationAttributes<PatchRevision>> {
  declare songId: string;
  declare revision: number;
  declare authorId: string | null;
  declare savedAt: Date;
  declare patch: Patch;
}

export function initPatchRevision(sequelize: Sequelize): void {
  PatchRevision.init(
    {
      songId: { type: DataTypes.STRING(64), primaryKey: true },
      revision: { type: DataTypes.INTEGER, primaryKey: true },
      authorId: { type: DataTypes.STRING(64), allowNull: true },
      savedAt: { type: DataTypes.DATE, allowNull: false },
      patch: { type: DataTypes.JSON, allowNull: false },
    },
    { sequelize, tableName: "patch_revisions", timestamps: false, underscored: true },
  );
}
