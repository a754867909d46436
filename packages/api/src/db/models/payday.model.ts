import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class Payday extends Model<InferAttributes<Payday>, InferCreationAttributes<Payday>> {
  declare id: string;
  declare paysOn: string;
  declare note: CreationOptional<string>;
  declare madeBy: string;
  declare madeAt: Date;
  declare handedOverAt: CreationOptional<Date | null>;
  declare handedOverBy: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
}

export function initPayday(sequelize: Sequelize): void {
  Payday.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      paysOn: { type: DataTypes.DATEONLY, allowNull: false },
      note: { type: DataTypes.TEXT },
      madeBy: { type: DataTypes.UUID, allowNull: false },
      madeAt: { type: DataTypes.DATE, allowNull: false },
      handedOverAt: { type: DataTypes.DATE, allowNull: true },
      handedOverBy: { type: DataTypes.UUID, allowNull: true },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'Payday', tableName: 'paydays', underscored: true, timestamps: false },
  );
}
