import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class CompanySettings extends Model<InferAttributes<CompanySettings>, InferCreationAttributes<CompanySettings>> {
  declare id: number;
  declare name: string;
  declare phone: CreationOptional<string>;
  declare email: CreationOptional<string>;
  declare zone: string;
  declare clock: CreationOptional<'12' | '24'>;
  declare units: CreationOptional<'us' | 'metric'>;
  declare dayStartsAt: CreationOptional<string>;
  declare dayEndsAt: CreationOptional<string>;
  declare undoSeconds: CreationOptional<number>;
  declare reasonKinds: CreationOptional<string[]>;
  declare statementMailShowsFigures: CreationOptional<boolean>;
  declare emergencyNumber: CreationOptional<string>;
  declare mealReminderMinutes: CreationOptional<number | null>;
  declare restReminderMinutes: CreationOptional<number | null>;
  declare invoiceDueDays: CreationOptional<number>;
  declare deskDiscountPercent: CreationOptional<number>;
  declare billsFrom: CreationOptional<Date>;
  declare version: CreationOptional<number>;
  declare updatedAt: CreationOptional<Date>;
}

export function initCompanySettings(sequelize: Sequelize): void {
  CompanySettings.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      phone: { type: DataTypes.TEXT },
      email: { type: DataTypes.TEXT },
      zone: { type: DataTypes.TEXT, allowNull: false },
      clock: { type: DataTypes.TEXT },
      units: { type: DataTypes.TEXT },
      dayStartsAt: { type: DataTypes.TEXT },
      dayEndsAt: { type: DataTypes.TEXT },
      undoSeconds: { type: DataTypes.INTEGER },
      reasonKinds: { type: DataTypes.ARRAY(DataTypes.TEXT) },
      statementMailShowsFigures: { type: DataTypes.BOOLEAN },
      emergencyNumber: { type: DataTypes.TEXT },
      mealReminderMinutes: { type: DataTypes.INTEGER },
      restReminderMinutes: { type: DataTypes.INTEGER },
      invoiceDueDays: { type: DataTypes.INTEGER },
      deskDiscountPercent: { type: DataTypes.INTEGER },
      billsFrom: { type: DataTypes.DATE },
      version: { type: DataTypes.INTEGER },
      updatedAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: 'CompanySettings', tableName: 'company_settings', underscored: true, timestamps: false },
  );
}
