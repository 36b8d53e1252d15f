import { DataTypes, type QueryInterface } from "sequelize";

const id = { type: DataTypes.STRING(64), primaryKey: true, allowNull: false };

export async function up(query: QueryInterface): Promise<void> {
  await query.createTable("users", {
    id,
    email: { type: DataTypes.STRING(254), allowNull: false, unique: true },
    name: { type: DataTypes.STRING(60), allowNull: false },
    password_hash: { type: DataTypes.STRING(255), allowNull: false },
    session_epoch: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    created_at: { type: DataTypes.DATE, allowNull: false },
  });
  await query.createTable("rigs", {
    id,
    name: { type: DataTypes.STRING(60), allowNull: false },
    created_at: { type: DataTypes.DATE, allowNull: false },
  });
  await query.createTable("memberships", {
    rig_id: { ...id, references: { model: "rigs", key: "id" }, onDelete: "CASCADE" },
    user_id: { ...id, references: { model: "users", key: "id" }, onDelete: "CASCADE" },
    role: { type: DataTypes.STRING(20), allowNull: false },
  });
  await query.addIndex("memberships", ["user_id"]);
}

export async function down(query: QueryInterface): Promise<void> {
  await query.dropTable("memberships");
  await query.dropTable("rigs");
  await query.dropTable("users");
}
