import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import { stampColumns } from './columns.ts';
import type { WorkKind } from '@driprail/shared/domain/job-work/fold-work';
import type { StepRef } from '@driprail/shared/domain/job-work/step';

export class WorkEventRow extends Model<InferAttributes<WorkEventRow>, InferCreationAttributes<WorkEventRow>> {
  declare id: string;
  declare visitId: string;
  declare kind: WorkKind;
  declare steps: CreationOptional<StepRef[]>;
  declare lineId: CreationOptional<string | null>;
  declare keys: CreationOptional<string[]>;
  declare words: CreationOptional<string>;
  declare userId: string;
  declare personId: CreationOptional<string | null>;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
}

export function initWorkEventRow(sequelize: Sequelize): void {
  WorkEventRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      steps: { type: DataTypes.JSONB },
      lineId: { type: DataTypes.UUID, allowNull: true },
      keys: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      words: { type: DataTypes.TEXT },
      userId: { type: DataTypes.UUID, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: true },
      ...stampColumns(),
    },
    { sequelize, modelName: 'WorkEventRow', tableName: 'work_events', underscored: true, timestamps: false },
  );
}
