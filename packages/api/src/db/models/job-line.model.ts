import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { SizeClass } from '@driprail/shared/contracts/fields';

export class JobLine extends Model<InferAttributes<JobLine>, InferCreationAttributes<JobLine>> {
  declare id: string;
  declare jobId: string;
  declare serviceId: string;
  declare vehicleId: CreationOptional<string | null>;
  declare sizeClass: SizeClass;
  declare priceCents: number;
  declare minutes: number;
  declare position: number;
  declare finishedVisitId: CreationOptional<string | null>;
  declare finishedAt: CreationOptional<Date | null>;
}

export function initJobLine(sequelize: Sequelize): void {
  JobLine.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      serviceId: { type: DataTypes.UUID, allowNull: false },
      vehicleId: { type: DataTypes.UUID, allowNull: true },
      sizeClass: { type: DataTypes.TEXT, allowNull: false },
      priceCents: { type: DataTypes.BIGINT, allowNull: false },
      minutes: { type: DataTypes.INTEGER, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      finishedVisitId: { type: DataTypes.UUID, allowNull: true },
      finishedAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'JobLine', tableName: 'job_lines', underscored: true, timestamps: false },
  );
}
