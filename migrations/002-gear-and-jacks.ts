import { DataTypes, type QueryInterface } from "sequelize";

const text = (length: number) => ({ type: DataTypes.STRING(length), allowNull: false });

export async function up(query: QueryInterface): Promise<void> {
  await query.createTable("gear", {
    id: { ...text(64), primaryKey: true },
    rig_id: { ...text(64), references: { model: "rigs", key: "id" }, onDelete: "CASCADE" },
    kind: text(20),
    name: text(60),
    notes: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
    supply_id: { type: DataTypes.STRING(64), allowNull: true, references: { model: "gear", key: "id" }, onDelete: "SET NULL" },
    details: { type: DataTypes.JSON, allowNull: false },
    knobs: { type: DataTypes.JSON, allowNull: false },
    assumed: { type: DataTypes.JSON, allowNull: false },
    position: { type: DataTypes.INTEGER, allowNull: false },
    retired: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
  });
  await query.addIndex("gear", ["rig_id", "position"]);
  await query.createTable("jacks", {
    id: { ...text(64), primaryKey: true },
    gear_id: { ...text(64), references: { model: "gear", key: "id" }, onDelete: "CASCADE" },
    direction: text(6),
    name: text(60),
    connector: text(20),
    role: text(20),
    position: { type: DataTypes.INTEGER, allowNull: false },
    figures: { type: DataTypes.JSON, allowNull: false },
  });
  await query.addIndex("jacks", ["gear_id", "position"]);
}

export async function down(query: QueryInterface): Promise<void> {
  await query.dropTable("jacks");
  await query.dropTable("gear");
}
