import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CustomerLink extends Model<InferAttributes<CustomerLink>, InferCreationAttributes<CustomerLink>> {
  declare id: string;
  declare jobId: string;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
}

export function initCustomerLink(sequelize: Sequelize): void {
  CustomerLink.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      revokedAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'CustomerLink', tableName: 'customer_links', underscored: true, timestamps: false },
  );
}
