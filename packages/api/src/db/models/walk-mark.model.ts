import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { MarkAnswer, MarkKind, MarkSize } from '@driprail/shared/domain/walk-round/marks';

export class WalkMark extends Model<InferAttributes<WalkMark>, InferCreationAttributes<WalkMark>> {
  declare id: string;
  declare visitId: string;
  declare vehicleId: CreationOptional<string | null>;
  declare position: number;
  declare x: number;
  declare y: number;
  declare place: string;
  declare kind: MarkKind;
  declare size: MarkSize;
  declare note: CreationOptional<string>;
  declare carriedFrom: CreationOptional<string | null>;
  declare answer: CreationOptional<MarkAnswer | null>;
  declare isAddition: CreationOptional<boolean>;
  declare userId: string;
  declare receivedAt: Date;
  declare occurredAt: Date;
}

export function initWalkMark(sequelize: Sequelize): void {
  WalkMark.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      vehicleId: { type: DataTypes.UUID },
      position: { type: DataTypes.INTEGER, allowNull: false },
      x: { type: DataTypes.INTEGER, allowNull: false },
      y: { type: DataTypes.INTEGER, allowNull: false },
      place: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      size: { type: DataTypes.TEXT, allowNull: false },
      note: { type: DataTypes.TEXT },
      carriedFrom: { type: DataTypes.UUID },
      answer: { type: DataTypes.TEXT },
      isAddition: { type: DataTypes.BOOLEAN },
      userId: { type: DataTypes.UUID, allowNull: false },
      receivedAt: { type: DataTypes.DATE, allowNull: false },
      occurredAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'WalkMark', tableName: 'walk_marks', underscored: true, timestamps: false },
  );
}
