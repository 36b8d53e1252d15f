import { DataTypes, type QueryInterface } from "sequelize";

const text = (length: number) => ({ type: DataTypes.STRING(length), allowNull: false });

export async function up(query: QueryInterface): Promise<void> {
  await query.createTable("set_lists", {
    id: { ...text(64), primaryKey: true },
    rig_id: { ...text(64), references: { model: "rigs", key: "id" }, onDelete: "CASCADE" },
    name: text(60),
    position: { type: DataTypes.INTEGER, allowNull: false },
    revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
  });
  await query.addIndex("set_lists", ["rig_id", "position"]);
  await query.createTable("set_entries", {
    set_id: { ...text(64), primaryKey: true, references: { model: "set_lists", key: "id" }, onDelete: "CASCADE" },
    song_id: { ...text(64), primaryKey: true, references: { model: "songs", key: "id" }, onDelete: "CASCADE" },
    position: { type: DataTypes.INTEGER, allowNull: false },
  });
}

export async function down(query: QueryInterface): Promise<void> {
  await query.dropTable("set_entries");
  await query.dropTable("set_lists");
}
