import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { PlannedRange } from './columns.ts';

export class VanCrew extends Model<InferAttributes<VanCrew>, InferCreationAttributes<VanCrew>> {
  declare id: string;
  declare personId: string;
  declare vanId: string;
  declare span: PlannedRange;
  declare position: CreationOptional<number>;
}

export function initVanCrew(sequelize: Sequelize): void {
  VanCrew.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      vanId: { type: DataTypes.UUID, allowNull: false },
      span: { type: DataTypes.RANGE(DataTypes.DATE), allowNull: false },
      position: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'VanCrew', tableName: 'van_crew', underscored: true, timestamps: false },
  );
}
