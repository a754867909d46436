import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CreditNoteLine extends Model<InferAttributes<CreditNoteLine>, InferCreationAttributes<CreditNoteLine>> {
  declare creditNoteId: string;
  declare invoiceLineId: string;
  declare netCents: number;
}

export function initCreditNoteLine(sequelize: Sequelize): void {
  CreditNoteLine.init(
    {
      creditNoteId: { type: DataTypes.UUID, primaryKey: true },
      invoiceLineId: { type: DataTypes.UUID, primaryKey: true },
      netCents: { type: DataTypes.BIGINT, allowNull: false },
    },
    { sequelize, modelName: 'CreditNoteLine', tableName: 'credit_note_lines', underscored: true, timestamps: false },
  );
}
