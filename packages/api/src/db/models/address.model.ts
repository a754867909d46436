import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Drain, WashWater } from '@driprail/shared/domain/customer/place-facts';

export class Address extends Model<InferAttributes<Address>, InferCreationAttributes<Address>> {
  declare id: string;
  declare customerId: string;
  declare label: CreationOptional<string>;
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
  declare drain: CreationOptional<Drain>;
  declare washWater: CreationOptional<WashWater | null>;
  declare permitNumber: CreationOptional<string>;
  declare permitUntil: CreationOptional<string | null>;
  declare ownerConsentBy: CreationOptional<string>;
  declare ownerConsentOn: CreationOptional<string | null>;
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
      label: { type: DataTypes.TEXT },
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
      drain: { type: DataTypes.TEXT },
      washWater: { type: DataTypes.TEXT, allowNull: true },
      permitNumber: { type: DataTypes.TEXT },
      permitUntil: { type: DataTypes.DATEONLY, allowNull: true },
      ownerConsentBy: { type: DataTypes.TEXT },
      ownerConsentOn: { type: DataTypes.DATEONLY, allowNull: true },
      takesKey: { type: DataTypes.BOOLEAN },
      keyGoesBack: { type: DataTypes.TEXT },
      mustKnow: { type: DataTypes.TEXT },
      position: { type: DataTypes.INTEGER },
      isActive: { type: DataTypes.BOOLEAN },
    },
    { sequelize, modelName: 'Address', tableName: 'addresses', underscored: true, timestamps: false },
  );
}
