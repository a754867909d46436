import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import { stampColumns } from './columns.ts';
import type { JobChangeDto } from '@driprail/shared/contracts/job-work.contract';
import type { ChangedLine, ChangeLine, Hindrance } from '@driprail/shared/domain/job-work/judge-change';

export class JobChange extends Model<InferAttributes<JobChange>, InferCreationAttributes<JobChange>> {
  declare id: string;
  declare visitId: string;
  declare jobId: string;
  declare kind: JobChangeDto['kind'];
  declare state: JobChangeDto['state'];
  declare words: string;
  declare reason: string;
  declare before: ChangeLine[];
  declare after: ChangedLine[];
  declare priceDifferenceCents: number;
  declare minutesDifference: number;
  declare finishAt: Date;
  declare hindrances: Hindrance[];
  declare isBoardNotAsked: CreationOptional<boolean>;
  declare saidYesBy: CreationOptional<string>;
  declare saidYesAt: Date;
  declare userId: string;
  declare personId: CreationOptional<string | null>;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
  declare answeredBy: CreationOptional<string | null>;
  declare answeredAt: CreationOptional<Date | null>;
  declare answer: CreationOptional<string>;
}

export function initJobChange(sequelize: Sequelize): void {
  JobChange.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      jobId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      words: { type: DataTypes.TEXT, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      before: { type: DataTypes.JSONB, allowNull: false },
      after: { type: DataTypes.JSONB, allowNull: false },
      priceDifferenceCents: { type: DataTypes.BIGINT, allowNull: false },
      minutesDifference: { type: DataTypes.INTEGER, allowNull: false },
      finishAt: { type: DataTypes.DATE, allowNull: false },
      hindrances: { type: DataTypes.JSONB, allowNull: false },
      isBoardNotAsked: { type: DataTypes.BOOLEAN },
      saidYesBy: { type: DataTypes.TEXT },
      saidYesAt: { type: DataTypes.DATE, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: true },
      ...stampColumns(),
      answeredBy: { type: DataTypes.UUID, allowNull: true },
      answeredAt: { type: DataTypes.DATE, allowNull: true },
      answer: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: 'JobChange', tableName: 'job_changes', underscored: true, timestamps: false },
  );
}
