import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import { stampColumns } from './columns.ts';
import type { Body } from '@driprail/shared/domain/walk-round/body';
import type { Condition } from '@driprail/shared/domain/walk-round/condition';
import type { PhotoView } from '@driprail/shared/domain/walk-round/views';

export class WalkRound extends Model<InferAttributes<WalkRound>, InferCreationAttributes<WalkRound>> {
  declare id: string;
  declare visitId: string;
  declare vehicleId: CreationOptional<string | null>;
  declare body: Body;
  declare paint: CreationOptional<Condition | null>;
  declare interior: CreationOptional<Condition | null>;
  declare odometer: CreationOptional<number | null>;
  declare hasItems: CreationOptional<boolean | null>;
  declare itemsNote: CreationOptional<string>;
  declare mayMove: CreationOptional<boolean | null>;
  declare isTooDirty: CreationOptional<boolean>;
  declare missingReason: CreationOptional<string>;
  declare absentReason: CreationOptional<string>;
  declare initials: CreationOptional<number[][] | null>;
  declare photoViews: CreationOptional<{ id: string; view: PhotoView }[]>;
  declare isLate: CreationOptional<boolean>;
  declare userId: string;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
}

export function initWalkRound(sequelize: Sequelize): void {
  WalkRound.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      vehicleId: { type: DataTypes.UUID },
      body: { type: DataTypes.TEXT, allowNull: false },
      paint: { type: DataTypes.TEXT },
      interior: { type: DataTypes.TEXT },
      odometer: { type: DataTypes.INTEGER },
      hasItems: { type: DataTypes.BOOLEAN },
      itemsNote: { type: DataTypes.TEXT },
      mayMove: { type: DataTypes.BOOLEAN },
      isTooDirty: { type: DataTypes.BOOLEAN },
      missingReason: { type: DataTypes.TEXT },
      absentReason: { type: DataTypes.TEXT },
      initials: { type: DataTypes.JSONB },
      photoViews: { type: DataTypes.JSONB },
      isLate: { type: DataTypes.BOOLEAN },
      userId: { type: DataTypes.UUID, allowNull: false },
      ...stampColumns(),
    },
    { sequelize, modelName: 'WalkRound', tableName: 'walk_rounds', underscored: true, timestamps: false },
  );
}
