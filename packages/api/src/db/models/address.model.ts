import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Address extends Model<InferAttributes<Address>, InferCreationAttributes<Address>> {
  declare id: string;
  declare customerId: string;
  declare line: string;
  declare city: CreationOptional<string>;
  declare postcode: CreationOptional<string>;
  declare area: CreationOptional<string>;
  declare lat: CreationOptional<number | null>;
  declare lng: CreationOptional<number | null>;
  declare gateCode: CreationOptional<string>;
  declare accessNotes: CreationOptional<string>;
  declare hasWater: CreationOptional<boolean>;
  declare hasPower: CreationOptional<boolean>;
  declare hasDog: CreationOptional<boolean>;
  declare shutsGate: CreationOptional<boolean>;
  declare drainsToCreek: CreationOptional<boolean>;
  declare takesKey: CreationOptional<boolean>;
  declare keyGoesBack: CreationOptional<string>;
  declare mustKnow: CreationOptional<string>;
  declare position: CreationOptional<number>;
  declare isActive: CreationOptional<boolean>;
}

export function initAddress(sequelize: Sequelize): void {
  Address.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      customerId: { type: DataTypes.UUID, allowNull: false },
      line: { type: DataTypes.TEXT, allowNull: false },
      city: { type: DataTypes.TEXT },
      postcode: { type: DataTypes.TEXT },
      area: { type: DataTypes.TEXT },
      lat: { type: DataTypes.DOUBLE, allowNull: true },
      lng: { type: DataTypes.DOUBLE, allowNull: true },
      gateCode: { type: DataTypes.TEXT },
      accessNotes: { type: DataTypes.TEXT },
      hasWater: { type: DataTypes.BOOLEAN },
      hasPower: { type: DataTypes.BOOLEAN },
      hasDog: { type: DataTypes.BOOLEAN },
      shutsGate: { type: DataTypes.BOOLEAN },
      drainsToCreek: { type: DataTypes.BOOLEAN },
      takesKey: { type: DataTypes.BOOLEAN },
      keyGoesBack: { type: DataTypes.TEXT },
      mustKnow: { type: DataTypes.TEXT },
      position: { type: DataTypes.INTEGER },
      isActive: { type: DataTypes.BOOLEAN },
    },
    { sequelize, modelName: 'Address', tableName: 'addresses', underscored: true, timestamps: false },
  );
}
