import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PayPlaceWage extends Model<InferAttributes<PayPlaceWage>, InferCreationAttributes<PayPlaceWage>> {
  declare id: string;
  declare placeId: string;
  declare startsOn: string;
  declare amount: string;
  declare source: CreationOptional<string>;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initPayPlaceWage(sequelize: Sequelize): void {
  PayPlaceWage.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      placeId: { type: DataTypes.UUID, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      amount: { type: DataTypes.DECIMAL(14, 6), allowNull: false },
      source: { type: DataTypes.TEXT },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayPlaceWage', tableName: 'pay_place_wages', underscored: true, timestamps: false },
  );
}
