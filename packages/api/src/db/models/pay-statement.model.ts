import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PayStatement extends Model<InferAttributes<PayStatement>, InferCreationAttributes<PayStatement>> {
  declare payWeekId: string;
  declare personId: string;
  declare grossCents: number;
  declare summary: object;
}

export function initPayStatement(sequelize: Sequelize): void {
  PayStatement.init(
    {
      payWeekId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
      grossCents: { type: DataTypes.BIGINT, allowNull: false },
      summary: { type: DataTypes.JSONB, allowNull: false },
    },
    { sequelize, modelName: 'PayStatement', tableName: 'pay_statements', underscored: true, timestamps: false },
  );
}
