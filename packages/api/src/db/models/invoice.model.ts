import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { BillTo } from '@driprail/shared/contracts/bill.dto';

export class Invoice extends Model<InferAttributes<Invoice>, InferCreationAttributes<Invoice>> {
  declare id: string;
  declare number: number;
  declare jobId: string;
  declare customerId: string;
  declare issuedAt: Date;
  declare issuedBy: CreationOptional<string | null>;
  declare dueOn: string;
  declare billTo: BillTo;
  declare place: string;
  declare discountReason: CreationOptional<string>;
  declare netCents: number;
  declare taxCents: number;
  declare totalCents: number;
  declare voidedAt: CreationOptional<Date | null>;
}

export function initInvoice(sequelize: Sequelize): void {
  Invoice.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      number: { type: DataTypes.INTEGER, allowNull: false },
      jobId: { type: DataTypes.UUID, allowNull: false },
      customerId: { type: DataTypes.UUID, allowNull: false },
      issuedAt: { type: DataTypes.DATE, allowNull: false },
      issuedBy: { type: DataTypes.UUID, allowNull: true },
      dueOn: { type: DataTypes.DATEONLY, allowNull: false },
      billTo: { type: DataTypes.JSONB, allowNull: false },
      place: { type: DataTypes.TEXT, allowNull: false },
      discountReason: { type: DataTypes.TEXT },
      netCents: { type: DataTypes.BIGINT, allowNull: false },
      taxCents: { type: DataTypes.BIGINT, allowNull: false },
      totalCents: { type: DataTypes.BIGINT, allowNull: false },
      voidedAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'Invoice', tableName: 'invoices', underscored: true, timestamps: false },
  );
}
