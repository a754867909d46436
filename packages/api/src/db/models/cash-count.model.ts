import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CashCount extends Model<InferAttributes<CashCount>, InferCreationAttributes<CashCount>> {
  declare id: string;
  declare personId: string;
  declare expectedCents: number;
  declare countedCents: number;
  declare note: CreationOptional<string>;
  declare countedAt: Date;
  declare countedBy: string;
}

export function initCashCount(sequelize: Sequelize): void {
  CashCount.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      expectedCents: { type: DataTypes.BIGINT, allowNull: false },
      countedCents: { type: DataTypes.BIGINT, allowNull: false },
      note: { type: DataTypes.TEXT },
      countedAt: { type: DataTypes.DATE, allowNull: false },
      countedBy: { type: DataTypes.UUID, allowNull: false },
    },
    { sequelize, modelName: 'CashCount', tableName: 'cash_counts', underscored: true, timestamps: false },
  );
}
