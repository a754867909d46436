import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { EntrySpan } from '@driprail/shared/contracts/hours.contract';

export class ClockRequest extends Model<InferAttributes<ClockRequest>, InferCreationAttributes<ClockRequest>> {
  declare id: string;
  declare personId: string;
  declare entryId: CreationOptional<string | null>;
  declare direction: 'asked' | 'proposed';
  declare userId: string;
  declare at: Date;
  declare before: CreationOptional<object | null>;
  declare after: EntrySpan;
  declare reason: string;
  declare state: CreationOptional<'open' | 'agreed' | 'refused'>;
  declare decidedBy: CreationOptional<string | null>;
  declare decidedAt: CreationOptional<Date | null>;
  declare answer: CreationOptional<string>;
}

export function initClockRequest(sequelize: Sequelize): void {
  ClockRequest.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      entryId: { type: DataTypes.UUID, allowNull: true },
      direction: { type: DataTypes.TEXT, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
      before: { type: DataTypes.JSONB, allowNull: true },
      after: { type: DataTypes.JSONB, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      state: { type: DataTypes.TEXT },
      decidedBy: { type: DataTypes.UUID, allowNull: true },
      decidedAt: { type: DataTypes.DATE, allowNull: true },
      answer: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: 'ClockRequest', tableName: 'clock_requests', underscored: true, timestamps: false },
  );
}
