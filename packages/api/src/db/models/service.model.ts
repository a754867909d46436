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
      isActive: { type: DataTypes.BOOLEAN },
      position: { type: DataTypes.INTEGER },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Service', tableName: 'services', underscored: true, timestamps: false },
  );
}
