import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<number>;
  declare at: Date;
  declare userId: CreationOptional<string | null>;
  declare entity: string;
  declare entityId: string;
  declare action: string;
  declare details: CreationOptional<object>;
}

export function initAuditEntry(sequelize: Sequelize): void {
  AuditEntry.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      at: { type: DataTypes.DATE, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: true },
      entity: { type: DataTypes.TEXT, allowNull: false },
      entityId: { type: DataTypes.TEXT, allowNull: false },
      action: { type: DataTypes.TEXT, allowNull: false },
      details: { type: DataTypes.JSONB },
    },
    { sequelize, modelName: 'AuditEntry', tableName: 'audit_entries', underscored: true, timestamps: false },
  );
}
