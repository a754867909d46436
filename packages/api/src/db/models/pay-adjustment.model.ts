import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { AdjustmentKind, CountedAmount } from '@driprail/shared/domain/pay/pay-week.types';
import type { TimeOffTaken } from '@driprail/shared/domain/pay/time-off/time-off-pay';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';

export interface TimeOffBasis extends Pick<TimeOffTaken, 'ruleId' | 'ruleWords' | 'rateWords'> {
  /** Warnings that the owner took with a reason. */
  accepted: { code: string; reason: string }[];
}

export class PayAdjustment extends Model<InferAttributes<PayAdjustment>, InferCreationAttributes<PayAdjustment>> {
  declare id: string;
  declare payWeekId: string;
  declare personId: string;
  declare kind: AdjustmentKind;
  declare amountCents: number;
  declare reason: string;
  declare correctsLineId: CreationOptional<string | null>;
  /** The count and the rate that an amount stands for. */
  declare counted: CreationOptional<CountedAmount | null>;
  declare refundReasonId: CreationOptional<string | null>;
  /** The hours that an amount of paid time off stands for; all five or none. */
  declare timeOffKind: CreationOptional<TimeOffKind | null>;
  declare timeOffHours: CreationOptional<string | null>;
  declare timeOffOn: CreationOptional<string | null>;
  declare timeOffRate: CreationOptional<string | null>;
  declare timeOffBasis: CreationOptional<TimeOffBasis | null>;
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
      counted: { type: DataTypes.JSONB, allowNull: true },
      refundReasonId: { type: DataTypes.UUID, allowNull: true },
      timeOffKind: { type: DataTypes.TEXT, allowNull: true },
      timeOffHours: { type: DataTypes.TEXT, allowNull: true },
      timeOffOn: { type: DataTypes.DATEONLY, allowNull: true },
      timeOffRate: { type: DataTypes.TEXT, allowNull: true },
      timeOffBasis: { type: DataTypes.JSONB, allowNull: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayAdjustment', tableName: 'pay_adjustments', underscored: true, timestamps: false },
  );
}
