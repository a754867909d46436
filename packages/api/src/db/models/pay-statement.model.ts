import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PayStatement extends Model<InferAttributes<PayStatement>, InferCreationAttributes<PayStatement>> {
  declare payWeekId: string;
  declare personId: string;
  declare grossCents: number;
  declare summary: object;
  /** Balances of paid time off as they stood at the lock; null in weeks locked before. */
  declare timeOff: CreationOptional<object | null>;
}

export function initPayStatement(sequelize: Sequelize): void {
  PayStatement.init(
    {
      payWeekId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
      grossCents: { type: DataTypes.BIGINT, allowNull: false },
      summary: { type: DataTypes.JSONB, allowNull: false },
      timeOff: { type: DataTypes.JSONB, allowNull: true },
    },
    { sequelize, modelName: 'PayStatement', tableName: 'pay_statements', underscored: true, timestamps: false },
  );
}
