import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class MessageSettings extends Model<InferAttributes<MessageSettings>, InferCreationAttributes<MessageSettings>> {
  declare id: CreationOptional<number>;
  declare quietFrom: CreationOptional<string>;
  declare quietTo: CreationOptional<string>;
  declare reminderAt: CreationOptional<string>;
  declare feedbackHours: CreationOptional<number>;
  declare version: CreationOptional<number>;
}

export function initMessageSettings(sequelize: Sequelize): void {
  MessageSettings.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true },
      quietFrom: { type: DataTypes.TEXT },
      quietTo: { type: DataTypes.TEXT },
      reminderAt: { type: DataTypes.TEXT },
      feedbackHours: { type: DataTypes.INTEGER },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'MessageSettings', tableName: 'message_settings', underscored: true, timestamps: false },
  );
}
