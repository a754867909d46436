import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class PayAgreement extends Model<InferAttributes<PayAgreement>, InferCreationAttributes<PayAgreement>> {
  declare id: string;
  declare personId: string;
  declare kind: 'refunds' | 'rate_in_effect';
  declare startsOn: string;
  declare signedOn: string | null;
  declare note: string;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initPayAgreement(sequelize: Sequelize): void {
  PayAgreement.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      signedOn: { type: DataTypes.DATEONLY, allowNull: true },
      note: { type: DataTypes.TEXT, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'PayAgreement', tableName: 'pay_agreements', underscored: true, timestamps: false },
  );
}
