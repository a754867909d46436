import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: string;
  declare name: string;
  declare phone: CreationOptional<string>;
  declare skills: CreationOptional<string[]>;
  declare isTrainee: CreationOptional<boolean>;
  declare isActive: CreationOptional<boolean>;
  declare version: CreationOptional<number>;
}

export function initPerson(sequelize: Sequelize): void {
  Person.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      phone: { type: DataTypes.TEXT },
      skills: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      isTrainee: { type: DataTypes.BOOLEAN },
      isActive: { type: DataTypes.BOOLEAN },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Person', tableName: 'people', underscored: true, timestamps: false },
  );
}
