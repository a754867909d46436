import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Van extends Model<InferAttributes<Van>, InferCreationAttributes<Van>> {
  declare id: string;
  declare name: string;
  declare plate: CreationOptional<string>;
  declare equipment: CreationOptional<string[]>;
  declare notes: CreationOptional<string>;
  declare position: CreationOptional<number>;
  declare isActive: CreationOptional<boolean>;
  declare version: CreationOptional<number>;
}

export function initVan(sequelize: Sequelize): void {
  Van.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      plate: { type: DataTypes.TEXT },
      equipment: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      notes: { type: DataTypes.TEXT },
      position: { type: DataTypes.INTEGER },
      isActive: { type: DataTypes.BOOLEAN },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Van', tableName: 'vans', underscored: true, timestamps: false },
  );
}
