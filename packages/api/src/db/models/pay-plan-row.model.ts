import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { PayPlan } from '@driprail/shared/domain/pay/plans/pay-plan';

export class PayPlanRow extends Model<InferAttributes<PayPlanRow>, InferCreationAttributes<PayPlanRow>> {
  declare id: string;
  declare personId: string;
  declare startsOn: string;
  declare plan: PayPlan;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initPayPlanRow(sequelize: Sequelize): void {
  PayPlanRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      plan: { type: DataTypes.JSONB, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayPlanRow', tableName: 'pay_plans', underscored: true, timestamps: false },
  );
}
