import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TimeOffKind, TimeOffRule } from '@driprail/shared/domain/pay/time-off/time-off-rule';

export class TimeOffRuleRow extends Model<InferAttributes<TimeOffRuleRow>, InferCreationAttributes<TimeOffRuleRow>> {
  declare id: string;
  declare kind: TimeOffKind;
  declare personId: CreationOptional<string | null>;
  declare startsOn: string;
  declare rule: TimeOffRule;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initTimeOffRuleRow(sequelize: Sequelize): void {
  TimeOffRuleRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: true },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      rule: { type: DataTypes.JSONB, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'TimeOffRuleRow', tableName: 'time_off_rules', underscored: true, timestamps: false },
  );
}
