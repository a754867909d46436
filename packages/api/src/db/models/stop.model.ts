import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Stop extends Model<InferAttributes<Stop>, InferCreationAttributes<Stop>> {
  declare id: string;
  declare addressId: string;
}

export function initStop(sequelize: Sequelize): void {
  Stop.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      addressId: { type: DataTypes.UUID, allowNull: false },
    },
    { sequelize, modelName: 'Stop', tableName: 'stops', underscored: true, timestamps: false },
  );
}
