import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { PersonFigures } from '@driprail/shared/domain/pay/week-difference';

export class PayWeek extends Model<InferAttributes<PayWeek>, InferCreationAttributes<PayWeek>> {
  declare id: string;
  declare startsOn: string;
  declare endsOn: string;
  declare startsAt: Date;
  declare endsAt: Date;
  declare state: CreationOptional<'draft' | 'checked' | 'locked'>;
  declare checkedAt: CreationOptional<Date | null>;
  declare checkedBy: CreationOptional<string | null>;
  declare lockedAt: CreationOptional<Date | null>;
  declare lockedBy: CreationOptional<string | null>;
  declare engineVersion: CreationOptional<string | null>;
  declare snapshot: CreationOptional<object | null>;
  /** The figures as they were when the week was last checked. */
  declare lastChecked: CreationOptional<{ at: string; people: PersonFigures[] } | null>;
  declare version: CreationOptional<number>;
}

export function initPayWeek(sequelize: Sequelize): void {
  PayWeek.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      endsOn: { type: DataTypes.DATEONLY, allowNull: false },
      startsAt: { type: DataTypes.DATE, allowNull: false },
      endsAt: { type: DataTypes.DATE, allowNull: false },
      state: { type: DataTypes.TEXT },
      checkedAt: { type: DataTypes.DATE, allowNull: true },
      checkedBy: { type: DataTypes.UUID, allowNull: true },
      lockedAt: { type: DataTypes.DATE, allowNull: true },
      lockedBy: { type: DataTypes.UUID, allowNull: true },
      engineVersion: { type: DataTypes.TEXT, allowNull: true },
      snapshot: { type: DataTypes.JSONB, allowNull: true },
      lastChecked: { type: DataTypes.JSONB, allowNull: true },
      version: { type: DataTypes.INTEGER },
    },
    { sequelize, modelName: 'PayWeek', tableName: 'pay_weeks', underscored: true, timestamps: false },
  );
}
