import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import { stampColumns } from './columns.ts';
import type { PhotoMoment, PhotoView } from '@driprail/shared/domain/walk-round/views';

export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
  declare id: string;
  declare visitId: string;
  declare vehicleId: CreationOptional<string | null>;
  declare view: PhotoView;
  declare moment: PhotoMoment;
  declare bytes: number;
  declare sha256: string;
  declare receivedBytes: CreationOptional<number>;
  declare refused: CreationOptional<string | null>;
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare storageKey: CreationOptional<string | null>;
  declare storedAt: CreationOptional<Date | null>;
  declare isAddition: CreationOptional<boolean>;
  declare userId: string;
  declare deviceAt: Date;
  declare receivedAt: Date;
  declare occurredAt: Date;
  declare isCorrected: CreationOptional<boolean>;
}

export function initPhoto(sequelize: Sequelize): void {
  Photo.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      visitId: { type: DataTypes.UUID, allowNull: false },
      vehicleId: { type: DataTypes.UUID },
      view: { type: DataTypes.TEXT, allowNull: false },
      moment: { type: DataTypes.TEXT, allowNull: false },
      bytes: { type: DataTypes.INTEGER, allowNull: false },
      sha256: { type: DataTypes.TEXT, allowNull: false },
      receivedBytes: { type: DataTypes.INTEGER },
      refused: { type: DataTypes.TEXT },
      width: { type: DataTypes.INTEGER },
      height: { type: DataTypes.INTEGER },
      storageKey: { type: DataTypes.TEXT },
      storedAt: { type: DataTypes.DATE },
      isAddition: { type: DataTypes.BOOLEAN },
      userId: { type: DataTypes.UUID, allowNull: false },
      ...stampColumns(),
    },
    { sequelize, modelName: 'Photo', tableName: 'photos', underscored: true, timestamps: false },
  );
}
