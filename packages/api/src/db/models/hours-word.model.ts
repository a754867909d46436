import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class HoursWord extends Model<InferAttributes<HoursWord>, InferCreationAttributes<HoursWord>> {
  declare id: string;
  declare personId: string;
  declare weekStartsOn: string;
  declare isRight: boolean;
  declare note: CreationOptional<string>;
  declare userId: string;
  declare at: Date;
}

export function initHoursWord(sequelize: Sequelize): void {
  HoursWord.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      weekStartsOn: { type: DataTypes.DATEONLY, allowNull: false },
      isRight: { type: DataTypes.BOOLEAN, allowNull: false },
      note: { type: DataTypes.TEXT },
      userId: { type: DataTypes.UUID, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'HoursWord', tableName: 'hours_words', underscored: true, timestamps: false },
  );
}
