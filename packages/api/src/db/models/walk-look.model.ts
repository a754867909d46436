import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import { stampColumns } from './columns.ts';
import type { LookOutcome } from '@driprail/shared/domain/walk-round/condition';

export class WalkLook extends Model<InferAttributes<WalkLook>, InferCreationAttributes<WalkLook>> {
  declare id: string;
  declare visitId: string;
  declare vehicleId: CreationOptional<string | null>;
  declare outcome: LookOutcome;
  declare note: CreationOptional<string>;
  declare userId: string;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
}

export function initWalkLook(sequelize: Sequelize): void {
  WalkLook.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      vehicleId: { type: DataTypes.UUID },
      outcome: { type: DataTypes.TEXT, allowNull: false },
      note: { type: DataTypes.TEXT },
      userId: { type: DataTypes.UUID, allowNull: false },
      ...stampColumns(),
    },
    { sequelize, modelName: 'WalkLook', tableName: 'walk_looks', underscored: true, timestamps: false },
  );
}
