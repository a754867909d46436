import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { PaymentMethod } from '@driprail/shared/contracts/bill.dto';

export class Payment extends Model<InferAttributes<Payment>, InferCreationAttributes<Payment>> {
  declare id: string;
  declare jobId: string;
  declare method: PaymentMethod;
  declare amountCents: number;
  declare receivedAt: Date;
  declare recordedAt: Date;
  declare recordedBy: CreationOptional<string | null>;
  declare personId: CreationOptional<string | null>;
  declare reference: CreationOptional<string>;
  declare attemptId: CreationOptional<string | null>;
  declare providerRef: CreationOptional<string | null>;
}

export function initPayment(sequelize: Sequelize): void {
  Payment.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      method: { type: DataTypes.TEXT, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      receivedAt: { type: DataTypes.DATE, allowNull: false },
      recordedAt: { type: DataTypes.DATE, allowNull: false },
      recordedBy: { type: DataTypes.UUID, allowNull: true },
      personId: { type: DataTypes.UUID, allowNull: true },
      reference: { type: DataTypes.TEXT },
      attemptId: { type: DataTypes.UUID, allowNull: true },
      providerRef: { type: DataTypes.TEXT, allowNull: true },
    },
    { sequelize, modelName: 'Payment', tableName: 'payments', underscored: true, timestamps: false },
  );
}
