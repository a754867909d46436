import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Feedback extends Model<InferAttributes<Feedback>, InferCreationAttributes<Feedback>> {
  declare jobId: string;
  declare stars: number;
  declare words: CreationOptional<string>;
  declare givenAt: Date;
}

export function initFeedback(sequelize: Sequelize): void {
  Feedback.init(
    {
      jobId: { type: DataTypes.UUID, primaryKey: true },
      stars: { type: DataTypes.INTEGER, allowNull: false },
      words: { type: DataTypes.TEXT },
      givenAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'Feedback', tableName: 'feedback', underscored: true, timestamps: false },
  );
}
