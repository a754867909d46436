import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** Two records that somebody looked at and found to be two customers; the smaller id first. */
export class CustomerApart extends Model<InferAttributes<CustomerApart>, InferCreationAttributes<CustomerApart>> {
  declare customerId: string;
  declare otherId: string;
  declare userId: string;
  declare at: Date;
}

export function initCustomerApart(sequelize: Sequelize): void {
  CustomerApart.init(
    {
      customerId: { type: DataTypes.UUID, primaryKey: true },
      otherId: { type: DataTypes.UUID, primaryKey: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'CustomerApart', tableName: 'customers_apart', underscored: true, timestamps: false },
  );
}
