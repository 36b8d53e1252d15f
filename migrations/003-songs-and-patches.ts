import { DataTypes, type QueryInterface } from "sequelize";

const text = (length: number) => ({ type: DataTypes.STRING(length), allowNull: false });

export async function up(query: QueryInterface): Promise<void> {
  await query.createTable("songs", {
    id: { ...text(64), primaryKey: true },
    rig_id: { ...text(64), references: { model: "rigs", key: "id" }, onDelete: "CASCADE" },
    title: text(60),
    tempo_bpm: { type: DataTypes.DOUBLE, allowNull: true },
    notes: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
    position: { type: DataTypes.INTEGER, allowNull: false },
    revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
  });
  await query.addIndex("songs", ["rig_id", "position"]);
  await query.createTable("patch_revisions", {
    song_id: { ...text(64), primaryKey: true, references: { model: "songs", key: "id" }, onDelete: "CASCADE" },
    revision: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
    author_id: { type: DataTypes.STRING(64), allowNull: true, references: { model: "users", key: "id" }, onDelete: "SET NULL" },
    saved_at: { type: DataTypes.DATE, allowNull: false },
    patch: { type: DataTypes.JSON, allowNull: false },
  });
}

export async function down(query: QueryInterface): Promise<void> {
  await query.dropTable("patch_revisions");
  await query.dropTable("songs");
}
