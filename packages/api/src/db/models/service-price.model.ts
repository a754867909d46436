import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { SizeClass } from '@driprail/shared/contracts/fields';

export class ServicePrice extends Model<InferAttributes<ServicePrice>, InferCreationAttributes<ServicePrice>> {
  declare serviceId: string;
  declare sizeClass: SizeClass;
  declare startsOn: string;
  declare priceCents: number;
  declare minutes: number;
}

export function initServicePrice(sequelize: Sequelize): void {
  ServicePrice.init(
    {
      serviceId: { type: DataTypes.UUID, primaryKey: true },
      sizeClass: { type: DataTypes.TEXT, primaryKey: true },
      startsOn: { type: DataTypes.DATEONLY, primaryKey: true },
      priceCents: { type: DataTypes.BIGINT, allowNull: false },
      minutes: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'ServicePrice', tableName: 'service_prices', underscored: true, timestamps: false },
  );
}
