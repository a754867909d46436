import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CreditNoteTax extends Model<InferAttributes<CreditNoteTax>, InferCreationAttributes<CreditNoteTax>> {
  declare creditNoteId: string;
  declare invoiceTaxId: string;
  declare taxCents: number;
}

export function initCreditNoteTax(sequelize: Sequelize): void {
  CreditNoteTax.init(
    {
      creditNoteId: { type: DataTypes.UUID, primaryKey: true },
      invoiceTaxId: { type: DataTypes.UUID, primaryKey: true },
      taxCents: { type: DataTypes.BIGINT, allowNull: false },
    },
    { sequelize, modelName: 'CreditNoteTax', tableName: 'credit_note_taxes', underscored: true, timestamps: false },
  );
}
