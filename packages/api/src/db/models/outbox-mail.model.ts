import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class OutboxMail extends Model<InferAttributes<OutboxMail>, InferCreationAttributes<OutboxMail>> {
  declare id: string;
  declare recipient: string;
  declare subject: string;
  declare body: string;
  declare createdAt: CreationOptional<Date>;
  declare nextTryAt: CreationOptional<Date>;
  declare tries: CreationOptional<number>;
  declare sentAt: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
}

export function initOutboxMail(sequelize: Sequelize): void {
  OutboxMail.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      recipient: { type: DataTypes.TEXT, allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      body: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE },
      nextTryAt: { type: DataTypes.DATE },
      tries: { type: DataTypes.INTEGER },
      sentAt: { type: DataTypes.DATE, allowNull: true },
      lastError: { type: DataTypes.TEXT, allowNull: true },
    },
    { sequelize, modelName: 'OutboxMail', tableName: 'outbox_mails', underscored: true, timestamps: false },
  );
}
