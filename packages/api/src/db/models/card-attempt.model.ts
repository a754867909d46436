import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CardAttempt extends Model<InferAttributes<CardAttempt>, InferCreationAttributes<CardAttempt>> {
  declare id: string;
  declare jobId: string;
  declare amountCents: number;
  declare tipCents: CreationOptional<number>;
  declare state: CreationOptional<'open' | 'paid' | 'expired' | 'failed'>;
  declare providerRef: CreationOptional<string | null>;
  declare url: CreationOptional<string | null>;
  declare createdAt: Date;
  declare createdBy: CreationOptional<string | null>;
  declare settledAt: CreationOptional<Date | null>;
}

export function initCardAttempt(sequelize: Sequelize): void {
  CardAttempt.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      tipCents: { type: DataTypes.BIGINT },
      state: { type: DataTypes.TEXT },
      providerRef: { type: DataTypes.TEXT, allowNull: true },
      url: { type: DataTypes.TEXT, allowNull: true },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      createdBy: { type: DataTypes.UUID, allowNull: true },
      settledAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'CardAttempt', tableName: 'card_attempts', underscored: true, timestamps: false },
  );
}
