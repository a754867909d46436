import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';

export class MessageKindRow extends Model<InferAttributes<MessageKindRow>, InferCreationAttributes<MessageKindRow>> {
  declare kind: MessageKind;
  declare isOn: CreationOptional<boolean>;
  declare subject: CreationOptional<string | null>;
  declare body: CreationOptional<string | null>;
  declare textBody: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
}

export function initMessageKindRow(sequelize: Sequelize): void {
  MessageKindRow.init(
    {
      kind: { type: DataTypes.TEXT, primaryKey: true },
      isOn: { type: DataTypes.BOOLEAN },
      subject: { type: DataTypes.TEXT, allowNull: true },
      body: { type: DataTypes.TEXT, allowNull: true },
      textBody: { type: DataTypes.TEXT, allowNull: true },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'MessageKindRow', tableName: 'message_kinds', underscored: true, timestamps: false },
  );
}
