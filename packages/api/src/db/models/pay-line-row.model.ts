import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';

export class PayLineRow extends Model<InferAttributes<PayLineRow>, InferCreationAttributes<PayLineRow>> {
  declare id: string;
  declare payWeekId: string;
  declare personId: string;
  declare position: number;
  declare key: string;
  declare amountCents: number;
  declare isPayable: boolean;
  declare line: PayLine;
}

export function initPayLineRow(sequelize: Sequelize): void {
  PayLineRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      payWeekId: { type: DataTypes.UUID, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      key: { type: DataTypes.TEXT, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      isPayable: { type: DataTypes.BOOLEAN, allowNull: false },
      line: { type: DataTypes.JSONB, allowNull: false },
    },
    { sequelize, modelName: 'PayLineRow', tableName: 'pay_lines', underscored: true, timestamps: false },
  );
}
