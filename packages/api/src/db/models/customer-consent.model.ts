import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Channel } from '@driprail/shared/domain/customer/consent';

export class CustomerConsent extends Model<InferAttributes<CustomerConsent>, InferCreationAttributes<CustomerConsent>> {
  declare id: string;
  declare customerId: string;
  declare channel: Channel;
  declare isGiven: boolean;
  declare givenOn: string;
  declare how: string;
  declare userId: CreationOptional<string | null>;
  declare recordedAt: Date;
}

export function initCustomerConsent(sequelize: Sequelize): void {
  CustomerConsent.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      customerId: { type: DataTypes.UUID, allowNull: false },
      channel: { type: DataTypes.TEXT, allowNull: false },
      isGiven: { type: DataTypes.BOOLEAN, allowNull: false },
      givenOn: { type: DataTypes.DATEONLY, allowNull: false },
      how: { type: DataTypes.TEXT, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: true },
      recordedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'CustomerConsent', tableName: 'customer_consents', underscored: true, timestamps: false },
  );
}
