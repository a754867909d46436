import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';

export class TimeOffAdjustment extends Model<
  InferAttributes<TimeOffAdjustment>,
  InferCreationAttributes<TimeOffAdjustment>
> {
  declare id: string;
  declare personId: string;
  declare kind: TimeOffKind;
  declare onDate: string;
  declare hours: string;
  declare reason: string;
  declare userId: string;
  declare at: Date;
}

export function initTimeOffAdjustment(sequelize: Sequelize): void {
  TimeOffAdjustment.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      onDate: { type: DataTypes.DATEONLY, allowNull: false },
      hours: { type: DataTypes.TEXT, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
    },
    {
      ...{ sequelize, modelName: 'TimeOffAdjustment', tableName: 'time_off_adjustments' },
      ...{ underscored: true, timestamps: false },
    },
  );
}
