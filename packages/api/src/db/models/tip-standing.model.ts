import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class TipStanding extends Model<InferAttributes<TipStanding>, InferCreationAttributes<TipStanding>> {
  declare personId: string;
  declare startsOn: string;
  declare sharesTips: boolean;
}

export function initTipStanding(sequelize: Sequelize): void {
  TipStanding.init(
    {
      personId: { type: DataTypes.UUID, primaryKey: true },
      startsOn: { type: DataTypes.DATEONLY, primaryKey: true },
      sharesTips: { type: DataTypes.BOOLEAN, allowNull: false },
    },
    { sequelize, modelName: 'TipStanding', tableName: 'tip_standings', underscored: true, timestamps: false },
  );
}
