import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class ServiceInclude extends Model<InferAttributes<ServiceInclude>, InferCreationAttributes<ServiceInclude>> {
  declare serviceId: string;
  declare includedId: string;
  declare position: number;
}

export function initServiceInclude(sequelize: Sequelize): void {
  ServiceInclude.init(
    {
      serviceId: { type: DataTypes.UUID, primaryKey: true },
      includedId: { type: DataTypes.UUID, primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'ServiceInclude', tableName: 'service_includes', underscored: true, timestamps: false },
  );
}
