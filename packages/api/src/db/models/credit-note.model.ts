import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CreditNote extends Model<InferAttributes<CreditNote>, InferCreationAttributes<CreditNote>> {
  declare id: string;
  declare number: number;
  declare invoiceId: string;
  declare reasonId: CreationOptional<string | null>;
  declare note: CreationOptional<string>;
  declare netCents: number;
  declare taxCents: number;
  declare issuedAt: Date;
  declare issuedBy: string;
}

export function initCreditNote(sequelize: Sequelize): void {
  CreditNote.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      number: { type: DataTypes.INTEGER, allowNull: false },
      invoiceId: { type: DataTypes.UUID, allowNull: false },
      reasonId: { type: DataTypes.UUID, allowNull: true },
      note: { type: DataTypes.TEXT },
      netCents: { type: DataTypes.BIGINT, allowNull: false },
      taxCents: { type: DataTypes.BIGINT, allowNull: false },
      issuedAt: { type: DataTypes.DATE, allowNull: false },
      issuedBy: { type: DataTypes.UUID, allowNull: false },
    },
    { sequelize, modelName: 'CreditNote', tableName: 'credit_notes', underscored: true, timestamps: false },
  );
}
