import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class ClockCorrection extends Model<InferAttributes<ClockCorrection>, InferCreationAttributes<ClockCorrection>> {
  declare id: string;
  declare entryId: string;
  declare userId: string;
  declare at: Date;
  declare before: CreationOptional<object | null>;
  declare after: object;
  declare reason: string;
}

export function initClockCorrection(sequelize: Sequelize): void {
  ClockCorrection.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      entryId: { type: DataTypes.UUID, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
      before: { type: DataTypes.JSONB, allowNull: true },
      after: { type: DataTypes.JSONB, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
    },
    { sequelize, modelName: 'ClockCorrection', tableName: 'clock_corrections', underscored: true, timestamps: false },
  );
}
