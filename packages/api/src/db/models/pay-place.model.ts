import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { OwnRules } from '@driprail/shared/domain/pay/own-rules';

export class PayPlace extends Model<InferAttributes<PayPlace>, InferCreationAttributes<PayPlace>> {
  declare id: string;
  declare name: string;
  declare ruleSetKey: CreationOptional<string | null>;
  declare ownRules: CreationOptional<OwnRules | null>;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initPayPlace(sequelize: Sequelize): void {
  PayPlace.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      ruleSetKey: { type: DataTypes.TEXT, allowNull: true },
      ownRules: { type: DataTypes.JSONB, allowNull: true },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayPlace', tableName: 'pay_places', underscored: true, timestamps: false },
  );
}
