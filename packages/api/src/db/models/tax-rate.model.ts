import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';

export class TaxRateRow extends Model<InferAttributes<TaxRateRow>, InferCreationAttributes<TaxRateRow>> {
  declare id: string;
  declare name: string;
  declare taxClass: TaxClass;
  declare place: CreationOptional<string>;
  declare percent: string;
  declare startsOn: string;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initTaxRateRow(sequelize: Sequelize): void {
  TaxRateRow.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      taxClass: { type: DataTypes.TEXT, allowNull: false },
      place: { type: DataTypes.TEXT },
      percent: { type: DataTypes.DECIMAL, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'TaxRateRow', tableName: 'tax_rates', underscored: true, timestamps: false },
  );
}
