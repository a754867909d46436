import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class LoginLink extends Model<InferAttributes<LoginLink>, InferCreationAttributes<LoginLink>> {
  declare id: string;
  declare userId: string;
  declare kind: 'invitation' | 'reset';
  declare tokenHash: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}

export function initLoginLink(sequelize: Sequelize): void {
  LoginLink.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      usedAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'LoginLink', tableName: 'login_links', underscored: true, timestamps: false },
  );
}
