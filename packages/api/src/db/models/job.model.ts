import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { CallBackCause } from '@driprail/shared/domain/board/call-back';

export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: string;
  declare number: CreationOptional<number>;
  declare customerId: string;
  declare addressId: string;
  declare windowFrom: CreationOptional<Date | null>;
  declare windowTo: CreationOptional<Date | null>;
  declare notes: CreationOptional<string>;
  declare discountCents: CreationOptional<number>;
  declare discountReason: CreationOptional<string>;
  declare calledOffReason: CreationOptional<string | null>;
  /** The job that this one puts right, free to the customer. */
  declare callBackOf: CreationOptional<string | null>;
  declare callBackCause: CreationOptional<CallBackCause | null>;
  declare version: CreationOptional<number>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initJob(sequelize: Sequelize): void {
  Job.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      number: { type: DataTypes.INTEGER },
      customerId: { type: DataTypes.UUID, allowNull: false },
      addressId: { type: DataTypes.UUID, allowNull: false },
      windowFrom: { type: DataTypes.DATE, allowNull: true },
      windowTo: { type: DataTypes.DATE, allowNull: true },
      notes: { type: DataTypes.TEXT },
      discountCents: { type: DataTypes.BIGINT },
      discountReason: { type: DataTypes.TEXT },
      calledOffReason: { type: DataTypes.TEXT, allowNull: true },
      callBackOf: { type: DataTypes.UUID, allowNull: true },
      callBackCause: { type: DataTypes.TEXT, allowNull: true },
      version: { type: DataTypes.INTEGER },
      createdBy: { type: DataTypes.UUID, allowNull: true },
      createdAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'Job', tableName: 'jobs', underscored: true, timestamps: false },
  );
}
