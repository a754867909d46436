import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class ActionRecord extends Model<InferAttributes<ActionRecord>, InferCreationAttributes<ActionRecord>> {
  declare userId: string;
  declare key: string;
  declare bodyHash: string;
  declare isRefused: CreationOptional<boolean>;
  declare status: number;
  declare answer: object;
  declare receivedAt: CreationOptional<Date>;
}

export function initActionRecord(sequelize: Sequelize): void {
  ActionRecord.init(
    {
      userId: { type: DataTypes.UUID, primaryKey: true },
      key: { type: DataTypes.UUID, primaryKey: true },
      bodyHash: { type: DataTypes.TEXT, allowNull: false },
      isRefused: { type: DataTypes.BOOLEAN },
      status: { type: DataTypes.INTEGER, allowNull: false },
      answer: { type: DataTypes.JSONB, allowNull: false },
      receivedAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'ActionRecord', tableName: 'actions', underscored: true, timestamps: false },
  );
}
