import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PushSubscription extends Model<
  InferAttributes<PushSubscription>,
  InferCreationAttributes<PushSubscription>
> {
  declare id: string;
  declare userId: string;
  declare endpoint: string;
  declare p256dh: string;
  declare auth: string;
  declare createdAt: Date;
}

export function initPushSubscription(sequelize: Sequelize): void {
  PushSubscription.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      endpoint: { type: DataTypes.TEXT, allowNull: false },
      p256dh: { type: DataTypes.TEXT, allowNull: false },
      auth: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    {
      ...{ sequelize, modelName: 'PushSubscription', tableName: 'push_subscriptions' },
      ...{ underscored: true, timestamps: false },
    },
  );
}
