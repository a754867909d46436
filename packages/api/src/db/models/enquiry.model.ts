import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Enquiry extends Model<InferAttributes<Enquiry>, InferCreationAttributes<Enquiry>> {
  declare id: string;
  declare customerId: CreationOptional<string | null>;
  declare sender: string;
  declare body: string;
  declare providerKey: string;
  declare receivedAt: Date;
  declare settledAt: CreationOptional<Date | null>;
  declare settledBy: CreationOptional<string | null>;
}

export function initEnquiry(sequelize: Sequelize): void {
  Enquiry.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      customerId: { type: DataTypes.UUID, allowNull: true },
      sender: { type: DataTypes.TEXT, allowNull: false },
      body: { type: DataTypes.TEXT, allowNull: false },
      providerKey: { type: DataTypes.TEXT, allowNull: false },
      receivedAt: { type: DataTypes.DATE, allowNull: false },
      settledAt: { type: DataTypes.DATE, allowNull: true },
      settledBy: { type: DataTypes.UUID, allowNull: true },
    },
    { sequelize, modelName: 'Enquiry', tableName: 'enquiries', underscored: true, timestamps: false },
  );
}
