import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CashCountPayment extends Model<
  InferAttributes<CashCountPayment>,
  InferCreationAttributes<CashCountPayment>
> {
  declare paymentId: string;
  declare cashCountId: string;
}

export function initCashCountPayment(sequelize: Sequelize): void {
  CashCountPayment.init(
    {
      paymentId: { type: DataTypes.UUID, primaryKey: true },
      cashCountId: { type: DataTypes.UUID, allowNull: false },
    },
    {
      sequelize,
      modelName: 'CashCountPayment',
      tableName: 'cash_count_payments',
      underscored: true,
      timestamps: false,
    },
  );
}
