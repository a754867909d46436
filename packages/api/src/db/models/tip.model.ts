import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Tip extends Model<InferAttributes<Tip>, InferCreationAttributes<Tip>> {
  declare id: string;
  declare jobId: string;
  declare amountCents: number;
  declare method: 'card' | 'cash' | 'invoice';
  declare alreadyReceived: CreationOptional<boolean>;
  declare receivedAt: Date;
  declare forPersonId: CreationOptional<string | null>;
  /** Null where the customer gave it with a card, by the own page. */
  declare userId: CreationOptional<string | null>;
  declare paymentId: CreationOptional<string | null>;
}

export function initTip(sequelize: Sequelize): void {
  Tip.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      amountCents: { type: DataTypes.BIGINT, allowNull: false },
      method: { type: DataTypes.TEXT, allowNull: false },
      alreadyReceived: { type: DataTypes.BOOLEAN },
      receivedAt: { type: DataTypes.DATE, allowNull: false },
      forPersonId: { type: DataTypes.UUID, allowNull: true },
      userId: { type: DataTypes.UUID, allowNull: true },
      paymentId: { type: DataTypes.UUID, allowNull: true },
    },
    { sequelize, modelName: 'Tip', tableName: 'tips', underscored: true, timestamps: false },
  );
}
