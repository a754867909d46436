import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Refund extends Model<InferAttributes<Refund>, InferCreationAttributes<Refund>> {
  declare id: string;
  declare paymentId: string;
  declare kind: 'refund' | 'mistake' | 'dispute';
  declare amountCents: number;
  declare creditNoteId: CreationOptional<string | null>;
  declare note: CreationOptional<string>;
  declare state: 'asked' | 'done' | 'failed';
  declare fault: CreationOptional<string>;
  declare madeAt: Date;
  declare madeBy: CreationOptional<string | null>;
  declare providerRef: CreationOptional<string | null>;
}

export function initRefund(sequelize: Sequelize): void {
  Refund.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      paymentId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      creditNoteId: { type: DataTypes.UUID, allowNull: true },
      note: { type: DataTypes.TEXT },
      state: { type: DataTypes.TEXT, allowNull: false },
      fault: { type: DataTypes.TEXT },
      madeAt: { type: DataTypes.DATE, allowNull: false },
      madeBy: { type: DataTypes.UUID, allowNull: true },
      providerRef: { type: DataTypes.TEXT, allowNull: true },
    },
    { sequelize, modelName: 'Refund', tableName: 'refunds', underscored: true, timestamps: false },
  );
}
