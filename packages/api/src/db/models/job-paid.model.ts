import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class JobPaid extends Model<InferAttributes<JobPaid>, InferCreationAttributes<JobPaid>> {
  declare jobId: string;
  declare paidAt: Date;
  /** Null where the payment came by card. */
  declare recordedBy: CreationOptional<string | null>;
  declare recordedAt: Date;
}

export function initJobPaid(sequelize: Sequelize): void {
  JobPaid.init(
    {
      jobId: { type: DataTypes.UUID, primaryKey: true },
      paidAt: { type: DataTypes.DATE, allowNull: false },
      recordedBy: { type: DataTypes.UUID, allowNull: true },
      recordedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'JobPaid', tableName: 'jobs_paid', underscored: true, timestamps: false },
  );
}
