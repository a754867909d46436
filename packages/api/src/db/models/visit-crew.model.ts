import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class VisitCrew extends Model<InferAttributes<VisitCrew>, InferCreationAttributes<VisitCrew>> {
  declare visitId: string;
  declare personId: string;
  declare position: number;
  declare weight: CreationOptional<number>;
  declare isTrainee: CreationOptional<boolean>;
}

export function initVisitCrew(sequelize: Sequelize): void {
  VisitCrew.init(
    {
      visitId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
      position: { type: DataTypes.INTEGER, allowNull: false },
      weight: { type: DataTypes.INTEGER },
      isTrainee: { type: DataTypes.BOOLEAN },
    },
    { sequelize, modelName: 'VisitCrew', tableName: 'visit_crew', underscored: true, timestamps: false },
  );
}
