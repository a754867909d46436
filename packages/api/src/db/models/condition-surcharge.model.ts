import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { SurchargedCondition } from '@driprail/shared/domain/menu/condition-surcharge';

export class ConditionSurcharge extends Model<
  InferAttributes<ConditionSurcharge>,
  InferCreationAttributes<ConditionSurcharge>
> {
  declare id: string;
  declare condition: SurchargedCondition;
  declare pricePercent: number;
  declare minutesPercent: number;
  declare startsOn: string;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initConditionSurcharge(sequelize: Sequelize): void {
  ConditionSurcharge.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      condition: { type: DataTypes.TEXT, allowNull: false },
      pricePercent: { type: DataTypes.INTEGER, allowNull: false },
      minutesPercent: { type: DataTypes.INTEGER, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    {
      sequelize,
      modelName: 'ConditionSurcharge',
      tableName: 'condition_surcharges',
      underscored: true,
      timestamps: false,
    },
  );
}
