import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class VisitLine extends Model<InferAttributes<VisitLine>, InferCreationAttributes<VisitLine>> {
  declare visitId: string;
  declare jobLineId: string;
}

export function initVisitLine(sequelize: Sequelize): void {
  VisitLine.init(
    {
      visitId: { type: DataTypes.UUID, primaryKey: true },
      jobLineId: { type: DataTypes.UUID, primaryKey: true },
    },
    { sequelize, modelName: 'VisitLine', tableName: 'visit_lines', underscored: true, timestamps: false },
  );
}
