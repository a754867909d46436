import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PersonPlaceRow extends Model<InferAttributes<PersonPlaceRow>, InferCreationAttributes<PersonPlaceRow>> {
  declare id: string;
  declare personId: string;
  declare placeId: CreationOptional<string | null>;
  declare startsOn: string;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initPersonPlaceRow(sequelize: Sequelize): void {
  PersonPlaceRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      placeId: { type: DataTypes.UUID, allowNull: true },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PersonPlaceRow', tableName: 'person_places', underscored: true, timestamps: false },
  );
}
