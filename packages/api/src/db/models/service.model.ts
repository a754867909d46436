import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';
import type { PhotoSet } from '@driprail/shared/domain/walk-round/views';

export class Service extends Model<InferAttributes<Service>, InferCreationAttributes<Service>> {
  declare id: string;
  declare name: string;
  declare kind: 'package' | 'single' | 'add_on';
  declare description: CreationOptional<string>;
  declare skills: CreationOptional<string[]>;
  declare equipment: CreationOptional<string[]>;
  declare photoSet: CreationOptional<PhotoSet>;
  declare taxClass: CreationOptional<TaxClass>;
  declare needsWater: CreationOptional<boolean>;
  declare needsPower: CreationOptional<boolean>;
  declare needsDry: CreationOptional<boolean>;
  declare needsDaylight: CreationOptional<boolean>;
  declare coldestTenths: CreationOptional<number | null>;
  declare hottestTenths: CreationOptional<number | null>;
  declare cureHours: CreationOptional<number>;
  declare intervalDays: CreationOptional<number | null>;
  declare depositPercent: CreationOptional<number>;
  declare isActive: CreationOptional<boolean>;
  declare position: CreationOptional<number>;
  declare version: CreationOptional<number>;
}

export function initService(sequelize: Sequelize): void {
  Service.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT },
      skills: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      equipment: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      photoSet: { type: DataTypes.TEXT },
      taxClass: { type: DataTypes.TEXT },
      needsWater: { type: DataTypes.BOOLEAN },
      needsPower: { type: DataTypes.BOOLEAN },
      needsDry: { type: DataTypes.BOOLEAN },
      needsDaylight: { type: DataTypes.BOOLEAN },
      coldestTenths: { type: DataTypes.INTEGER },
      hottestTenths: { type: DataTypes.INTEGER },
      cureHours: { type: DataTypes.INTEGER },
      intervalDays: { type: DataTypes.INTEGER },
      depositPercent: { type: DataTypes.INTEGER },
      isActive: { type: DataTypes.BOOLEAN },
      position: { type: DataTypes.INTEGER },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Service', tableName: 'services', underscored: true, timestamps: false },
  );
}
