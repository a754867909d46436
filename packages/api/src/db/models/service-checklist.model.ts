import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';

export class ServiceChecklist extends Model<
  InferAttributes<ServiceChecklist>,
  InferCreationAttributes<ServiceChecklist>
> {
  declare serviceId: string;
  declare version: number;
  declare asksNote: CreationOptional<boolean>;
  declare steps: CheckStep[];
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initServiceChecklist(sequelize: Sequelize): void {
  ServiceChecklist.init(
    {
      serviceId: { type: DataTypes.UUID, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      asksNote: { type: DataTypes.BOOLEAN },
      steps: { type: DataTypes.JSONB, allowNull: false },
      createdBy: { type: DataTypes.UUID, allowNull: true },
      createdAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'ServiceChecklist', tableName: 'service_checklists', underscored: true, timestamps: false },
  );
}
