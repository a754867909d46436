import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { WheelFinish } from '@driprail/shared/domain/vehicle/wheel-finish';

export class Vehicle extends Model<InferAttributes<Vehicle>, InferCreationAttributes<Vehicle>> {
  declare id: string;
  declare customerId: string;
  declare label: string;
  declare year: CreationOptional<number | null>;
  declare make: CreationOptional<string>;
  declare model: CreationOptional<string>;
  declare color: CreationOptional<string>;
  declare plate: CreationOptional<string>;
  declare vin: CreationOptional<string>;
  declare sizeClass: SizeClass;
  declare wheelFinish: CreationOptional<WheelFinish>;
  declare paint: CreationOptional<string>;
  declare interior: CreationOptional<string>;
  declare notes: CreationOptional<string>;
  declare isCoated: CreationOptional<boolean>;
  declare mustKnow: CreationOptional<string>;
  declare position: CreationOptional<number>;
  declare isActive: CreationOptional<boolean>;
}

export function initVehicle(sequelize: Sequelize): void {
  Vehicle.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      customerId: { type: DataTypes.UUID, allowNull: false },
      label: { type: DataTypes.TEXT, allowNull: false },
      year: { type: DataTypes.INTEGER, allowNull: true },
      make: { type: DataTypes.TEXT },
      model: { type: DataTypes.TEXT },
      color: { type: DataTypes.TEXT },
      plate: { type: DataTypes.TEXT },
      vin: { type: DataTypes.TEXT },
      sizeClass: { type: DataTypes.TEXT, allowNull: false },
      wheelFinish: { type: DataTypes.TEXT },
      paint: { type: DataTypes.TEXT },
      interior: { type: DataTypes.TEXT },
      notes: { type: DataTypes.TEXT },
      isCoated: { type: DataTypes.BOOLEAN },
      mustKnow: { type: DataTypes.TEXT },
      position: { type: DataTypes.INTEGER },
      isActive: { type: DataTypes.BOOLEAN },
    },
    { sequelize, modelName: 'Vehicle', tableName: 'vehicles', underscored: true, timestamps: false },
  );
}
