import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { RateKind } from '@driprail/shared/domain/pay/pay-week.types';

export class PayRate extends Model<InferAttributes<PayRate>, InferCreationAttributes<PayRate>> {
  declare id: string;
  declare kind: RateKind;
  declare personId: CreationOptional<string | null>;
  declare serviceId: CreationOptional<string | null>;
  declare clockKind: CreationOptional<ClockKindName | null>;
  declare value: string;
  declare startsOn: string;
  declare setBy: CreationOptional<string | null>;
}

export function initPayRate(sequelize: Sequelize): void {
  PayRate.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: true },
      serviceId: { type: DataTypes.UUID, allowNull: true },
      clockKind: { type: DataTypes.TEXT, allowNull: true },
      value: { type: DataTypes.DECIMAL(14, 6), allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
    },
    { sequelize, modelName: 'PayRate', tableName: 'pay_rates', underscored: true, timestamps: false },
  );
}
