import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Customer extends Model<InferAttributes<Customer>, InferCreationAttributes<Customer>> {
  declare id: string;
  declare name: string;
  declare isCompany: CreationOptional<boolean>;
  declare phone: CreationOptional<string>;
  declare email: CreationOptional<string>;
  declare notes: CreationOptional<string>;
  declare isScentFree: CreationOptional<boolean>;
  declare ringsFirst: CreationOptional<boolean>;
  declare mustKnow: CreationOptional<string>;
  declare tags: CreationOptional<string[]>;
  declare mergedInto: CreationOptional<string | null>;
  declare mergedAt: CreationOptional<Date | null>;
  declare erasedAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
}

export function initCustomer(sequelize: Sequelize): void {
  Customer.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      isCompany: { type: DataTypes.BOOLEAN },
      phone: { type: DataTypes.TEXT },
      email: { type: DataTypes.TEXT },
      notes: { type: DataTypes.TEXT },
      isScentFree: { type: DataTypes.BOOLEAN },
      ringsFirst: { type: DataTypes.BOOLEAN },
      mustKnow: { type: DataTypes.TEXT },
      tags: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      mergedInto: { type: DataTypes.UUID, allowNull: true },
      mergedAt: { type: DataTypes.DATE, allowNull: true },
      erasedAt: { type: DataTypes.DATE, allowNull: true },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Customer', tableName: 'customers', underscored: true, timestamps: false },
  );
}
