import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';

export class ClockEntry extends Model<InferAttributes<ClockEntry>, InferCreationAttributes<ClockEntry>> {
  declare id: string;
  declare personId: string;
  declare kind: ClockKindName;
  declare visitId: CreationOptional<string | null>;
  declare startedAt: Date;
  declare endedAt: CreationOptional<Date | null>;
  declare isInterrupted: CreationOptional<boolean>;
  declare isCorrected: CreationOptional<boolean>;
  declare note: CreationOptional<string>;
  declare version: CreationOptional<number>;
}

export function initClockEntry(sequelize: Sequelize): void {
  ClockEntry.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      visitId: { type: DataTypes.UUID, allowNull: true },
      startedAt: { type: DataTypes.DATE, allowNull: false },
      endedAt: { type: DataTypes.DATE, allowNull: true },
      isInterrupted: { type: DataTypes.BOOLEAN },
      isCorrected: { type: DataTypes.BOOLEAN },
      note: { type: DataTypes.TEXT },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'ClockEntry', tableName: 'clock_entries', underscored: true, timestamps: false },
  );
}
