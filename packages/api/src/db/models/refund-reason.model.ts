import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class RefundReason extends Model<InferAttributes<RefundReason>, InferCreationAttributes<RefundReason>> {
  declare id: string;
  declare name: string;
  declare lowersCommission: boolean;
  declare startsOn: string;
  declare setBy: CreationOptional<string | null>;
  declare setAt: Date;
}

export function initRefundReason(sequelize: Sequelize): void {
  RefundReason.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      lowersCommission: { type: DataTypes.BOOLEAN, allowNull: false },
      startsOn: { type: DataTypes.DATEONLY, allowNull: false },
      setBy: { type: DataTypes.UUID, allowNull: true },
      setAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'RefundReason', tableName: 'refund_reasons', underscored: true, timestamps: false },
  );
}
