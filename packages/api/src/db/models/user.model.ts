import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Role } from '@driprail/shared/authz/actor';

export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare name: string;
  declare email: string;
  declare passwordHash: CreationOptional<string | null>;
  declare role: Role;
  declare personId: CreationOptional<string | null>;
  declare isActive: CreationOptional<boolean>;
  declare lastSeenAt: CreationOptional<Date | null>;
}

export function initUser(sequelize: Sequelize): void {
  User.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      email: { type: DataTypes.TEXT, allowNull: false },
      passwordHash: { type: DataTypes.TEXT, allowNull: true },
      role: { type: DataTypes.TEXT, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: true },
      isActive: { type: DataTypes.BOOLEAN },
      lastSeenAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'User', tableName: 'users', underscored: true, timestamps: false },
  );
}
