import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { ShowUpPayKind, ShowUpRule } from '@driprail/shared/domain/pay/time-off/show-up-rule';

export class ShowUpRuleRow extends Model<InferAttributes<ShowUpRuleRow>, InferCreationAttributes<ShowUpRuleRow>> {
  declare id: string;
  declare payKind: ShowUpPayKind;
  declare placeId: CreationOptional<string | null>;
  declare startsOn: string;
  declare rule: ShowUpRule;
  declare source: CreationOptional<string>;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initShowUpRuleRow(sequelize: Sequelize): void {
  ShowUpRuleRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      payKind: { type: DataTypes.TEXT, allowNull: false },
      placeId: { type: DataTypes.UUID, allowNull: true },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      rule: { type: DataTypes.JSONB, allowNull: false },
      source: { type: DataTypes.TEXT },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'ShowUpRuleRow', tableName: 'show_up_rules', underscored: true, timestamps: false },
  );
}
