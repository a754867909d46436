import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';

export class InvoiceTax extends Model<InferAttributes<InvoiceTax>, InferCreationAttributes<InvoiceTax>> {
  declare id: string;
  declare invoiceId: string;
  declare name: string;
  declare place: CreationOptional<string>;
  declare taxClass: TaxClass;
  declare percent: string;
  declare baseCents: number;
  declare taxCents: number;
  declare position: number;
}

export function initInvoiceTax(sequelize: Sequelize): void {
  InvoiceTax.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      invoiceId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      place: { type: DataTypes.TEXT },
      taxClass: { type: DataTypes.TEXT, allowNull: false },
      percent: { type: DataTypes.DECIMAL, allowNull: false },
      baseCents: { type: DataTypes.BIGINT, allowNull: false },
      taxCents: { type: DataTypes.BIGINT, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'InvoiceTax', tableName: 'invoice_taxes', underscored: true, timestamps: false },
  );
}
