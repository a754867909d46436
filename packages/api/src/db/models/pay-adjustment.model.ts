import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { AdjustmentKind } from '@driprail/shared/domain/pay/pay-week.types';

export class PayAdjustment extends Model<InferAttributes<PayAdjustment>, InferCreationAttributes<PayAdjustment>> {
  declare id: string;
  declare payWeekId: string;
  declare personId: string;
  declare kind: AdjustmentKind;
  declare amountCents: number;
  declare reason: string;
  declare correctsLineId: CreationOptional<string | null>;
  declare userId: string;
  declare at: Date;
}

export function initPayAdjustment(sequelize: Sequelize): void {
  PayAdjustment.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      payWeekId: { type: DataTypes.UUID, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      correctsLineId: { type: DataTypes.UUID, allowNull: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayAdjustment', tableName: 'pay_adjustments', underscored: true, timestamps: false },
  );
}
