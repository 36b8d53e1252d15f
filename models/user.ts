import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A person with an account. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  /** Raised to end every session that was opened before. */
  declare sessionEpoch: CreationOptional<number>;
  declare createdAt: Date;
}

export function initUser(sequelize: Sequelize): void {
  User.init(
    {
      id: { type: DataTypes.STRING(64), primaryKey: true },
      email: { type: DataTypes.STRING(254), allowNull: false, unique: true },
      name: { type: DataTypes.STRING(60), allowNull: false },
      passwordHash: { type: DataTypes.STRING(255), allowNull: false },
      sessionEpoch: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, tableName: "users", timestamps: false, underscored: true },
  );
}
