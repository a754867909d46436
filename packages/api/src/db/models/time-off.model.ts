import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class TimeOff extends Model<InferAttributes<TimeOff>, InferCreationAttributes<TimeOff>> {
  declare id: string;
  declare personId: string;
  declare startsOn: string;
  declare endsOn: string;
  declare note: CreationOptional<string>;
}

export function initTimeOff(sequelize: Sequelize): void {
  TimeOff.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      endsOn: { type: DataTypes.DATEONLY, allowNull: false },
      note: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: 'TimeOff', tableName: 'time_off', underscored: true, timestamps: false },
  );
}
