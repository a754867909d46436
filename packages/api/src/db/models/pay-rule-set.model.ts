import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type {
  CommissionEarned,
  CrewSplit,
  PremiumRounding,
  TipRules,
} from '@driprail/shared/domain/pay/pay-week.types';

export class PayRuleSet extends Model<InferAttributes<PayRuleSet>, InferCreationAttributes<PayRuleSet>> {
  declare id: string;
  declare startsOn: string;
  declare overtimeRuleSet: string;
  declare minimumWage: string;
  declare crewSplit: CrewSplit;
  declare mealBreakMinutes: CreationOptional<number>;
  declare punchRoundingMinutes: CreationOptional<5 | 6 | 15 | null>;
  declare premiumRounding: CreationOptional<PremiumRounding>;
  declare commissionEarned: CreationOptional<CommissionEarned>;
  declare tipsGoTo: CreationOptional<TipRules['goTo']>;
  declare tipCardFeePercent: CreationOptional<string>;
  declare workweekStartsOn: number;
  declare workweekStartsAt: CreationOptional<string>;
  declare setBy: CreationOptional<string | null>;
}

export function initPayRuleSet(sequelize: Sequelize): void {
  PayRuleSet.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      overtimeRuleSet: { type: DataTypes.TEXT, allowNull: false },
      minimumWage: { type: DataTypes.DECIMAL(14, 6), allowNull: false },
      crewSplit: { type: DataTypes.TEXT, allowNull: false },
      mealBreakMinutes: { type: DataTypes.INTEGER },
      punchRoundingMinutes: { type: DataTypes.INTEGER, allowNull: true },
      premiumRounding: { type: DataTypes.TEXT },
      commissionEarned: { type: DataTypes.TEXT },
      tipsGoTo: { type: DataTypes.TEXT },
      tipCardFeePercent: { type: DataTypes.DECIMAL(14, 6) },
      workweekStartsOn: { type: DataTypes.INTEGER, allowNull: false },
      workweekStartsAt: { type: DataTypes.TEXT },
      setBy: { type: DataTypes.UUID, allowNull: true },
    },
    { sequelize, modelName: 'PayRuleSet', tableName: 'pay_rules', underscored: true, timestamps: false },
  );
}
