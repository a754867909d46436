import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Channel } from '@driprail/shared/domain/customer/consent';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import type { MessageState } from '@driprail/shared/domain/messages/states';

export class Message extends Model<InferAttributes<Message>, InferCreationAttributes<Message>> {
  declare id: string;
  declare kind: MessageKind;
  declare channel: Channel;
  declare eventKey: string;
  declare customerId: string;
  declare jobId: string;
  declare visitId: CreationOptional<string | null>;
  declare causeId: CreationOptional<string | null>;
  declare amountCents: CreationOptional<number | null>;
  declare state: MessageState;
  declare reason: CreationOptional<string>;
  declare createdAt: Date;
  declare nextTryAt: Date;
  declare lastMoment: CreationOptional<Date | null>;
  declare tries: CreationOptional<number>;
  declare claimedAt: CreationOptional<Date | null>;
  declare sentAt: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string>;
  declare recipient: CreationOptional<string>;
  declare subject: CreationOptional<string>;
  declare body: CreationOptional<string>;
  declare toldFrom: CreationOptional<Date | null>;
  declare toldTo: CreationOptional<Date | null>;
  declare bouncedAt: CreationOptional<Date | null>;
}

export function initMessage(sequelize: Sequelize): void {
  Message.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      channel: { type: DataTypes.TEXT, allowNull: false },
      eventKey: { type: DataTypes.TEXT, allowNull: false },
      customerId: { type: DataTypes.UUID, allowNull: false },
      jobId: { type: DataTypes.UUID, allowNull: false },
      visitId: { type: DataTypes.UUID, allowNull: true },
      causeId: { type: DataTypes.UUID, allowNull: true },
      amountCents: { type: DataTypes.BIGINT, allowNull: true },
      state: { type: DataTypes.TEXT, allowNull: false },
      reason: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      nextTryAt: { type: DataTypes.DATE, allowNull: false },
      lastMoment: { type: DataTypes.DATE, allowNull: true },
      tries: { type: DataTypes.INTEGER },
      claimedAt: { type: DataTypes.DATE, allowNull: true },
      sentAt: { type: DataTypes.DATE, allowNull: true },
      lastError: { type: DataTypes.TEXT },
      recipient: { type: DataTypes.TEXT },
      subject: { type: DataTypes.TEXT },
      body: { type: DataTypes.TEXT },
      toldFrom: { type: DataTypes.DATE, allowNull: true },
      toldTo: { type: DataTypes.DATE, allowNull: true },
      bouncedAt: { type: DataTypes.DATE, allowNull: true },
    },
    { sequelize, modelName: 'Message', tableName: 'messages', underscored: true, timestamps: false },
  );
}
