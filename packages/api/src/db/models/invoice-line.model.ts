import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';

export class InvoiceLine extends Model<InferAttributes<InvoiceLine>, InferCreationAttributes<InvoiceLine>> {
  declare id: string;
  declare invoiceId: string;
  /** Null for a fee. */
  declare jobLineId: CreationOptional<string | null>;
  declare label: string;
  declare detail: CreationOptional<string>;
  declare taxClass: TaxClass;
  declare priceCents: number;
  declare discountCents: number;
  declare position: number;
}

export function initInvoiceLine(sequelize: Sequelize): void {
  InvoiceLine.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      invoiceId: { type: DataTypes.UUID, allowNull: false },
      jobLineId: { type: DataTypes.UUID, allowNull: true },
      label: { type: DataTypes.TEXT, allowNull: false },
      detail: { type: DataTypes.TEXT },
      taxClass: { type: DataTypes.TEXT, allowNull: false },
      priceCents: { type: DataTypes.BIGINT, allowNull: false },
      discountCents: { type: DataTypes.BIGINT, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'InvoiceLine', tableName: 'invoice_lines', underscored: true, timestamps: false },
  );
}
