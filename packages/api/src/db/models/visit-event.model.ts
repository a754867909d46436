import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Progress } from '@driprail/shared/domain/board/progress';
import type { VisitEventKind } from './columns.ts';
import { stampColumns } from './columns.ts';

export class VisitEvent extends Model<InferAttributes<VisitEvent>, InferCreationAttributes<VisitEvent>> {
  declare id: string;
  declare visitId: string;
  declare kind: VisitEventKind;
  declare fromProgress: Progress;
  declare toProgress: Progress;
  declare userId: CreationOptional<string | null>;
  declare personId: CreationOptional<string | null>;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
  declare isUndone: CreationOptional<boolean>;
  declare trouble: CreationOptional<string | null>;
  declare reason: CreationOptional<string>;
  declare settledAt: CreationOptional<Date | null>;
  declare settledBy: CreationOptional<string | null>;
  declare outcome: CreationOptional<string | null>;
}

export function initVisitEvent(sequelize: Sequelize): void {
  VisitEvent.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      fromProgress: { type: DataTypes.TEXT, allowNull: false },
      toProgress: { type: DataTypes.TEXT, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: true },
      personId: { type: DataTypes.UUID, allowNull: true },
      ...stampColumns(),
      isUndone: { type: DataTypes.BOOLEAN },
      trouble: { type: DataTypes.TEXT, allowNull: true },
      reason: { type: DataTypes.TEXT },
      settledAt: { type: DataTypes.DATE, allowNull: true },
      settledBy: { type: DataTypes.UUID, allowNull: true },
      outcome: { type: DataTypes.TEXT, allowNull: true },
    },
    { sequelize, modelName: 'VisitEvent', tableName: 'visit_events', underscored: true, timestamps: false },
  );
}
