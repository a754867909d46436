import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PaydayWeek extends Model<InferAttributes<PaydayWeek>, InferCreationAttributes<PaydayWeek>> {
  declare paydayId: string;
  declare payWeekId: string;
}

export function initPaydayWeek(sequelize: Sequelize): void {
  PaydayWeek.init(
    {
      paydayId: { type: DataTypes.UUID, primaryKey: true },
      payWeekId: { type: DataTypes.UUID, primaryKey: true },
    },
    { sequelize, modelName: 'PaydayWeek', tableName: 'payday_weeks', underscored: true, timestamps: false },
  );
}
