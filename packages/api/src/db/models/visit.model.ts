import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { AcceptedWarning, PlannedRange } from './columns.ts';
import type { Progress } from '@driprail/shared/domain/board/progress';

export class Visit extends Model<InferAttributes<Visit>, InferCreationAttributes<Visit>> {
  declare id: string;
  declare jobId: string;
  declare stopId: string;
  declare part: number;
  declare vanId: CreationOptional<string | null>;
  declare planned: CreationOptional<PlannedRange | null>;
  declare minutes: number;
  declare progress: CreationOptional<Progress>;
  declare progressSince: CreationOptional<Date | null>;
  declare reason: CreationOptional<string>;
  declare accepted: CreationOptional<AcceptedWarning[]>;
  declare planVersion: CreationOptional<number>;
  declare version: CreationOptional<number>;
}

export function initVisit(sequelize: Sequelize): void {
  Visit.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      stopId: { type: DataTypes.UUID, allowNull: false },
      part: { type: DataTypes.INTEGER, allowNull: false },
      vanId: { type: DataTypes.UUID, allowNull: true },
      planned: { type: DataTypes.RANGE(DataTypes.DATE), allowNull: true },
      minutes: { type: DataTypes.INTEGER, allowNull: false },
      progress: { type: DataTypes.TEXT },
      progressSince: { type: DataTypes.DATE, allowNull: true },
      reason: { type: DataTypes.TEXT },
      accepted: { type: DataTypes.JSONB },
      planVersion: { type: DataTypes.INTEGER },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Visit', tableName: 'visits', underscored: true, timestamps: false },
  );
}
