import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CustomerCrew extends Model<InferAttributes<CustomerCrew>, InferCreationAttributes<CustomerCrew>> {
  declare customerId: string;
  declare personId: string;
  declare position: number;
}

export function initCustomerCrew(sequelize: Sequelize): void {
  CustomerCrew.init(
    {
      customerId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'CustomerCrew', tableName: 'customer_crew', underscored: true, timestamps: false },
  );
}
