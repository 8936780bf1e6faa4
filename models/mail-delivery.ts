import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** A mail that the SMTP server has taken. */
export class MailDelivery extends Model<InferAttributes<MailDelivery>, InferCreationAttributes<MailDelivery>> {
  declare id: string;
  declare template: string;
  declare createdAt: CreationOptional<Date>;
}

export function initMailDelivery(sequelize: Sequelize): void {
  MailDelivery.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      template: { type: DataTypes.TEXT, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'MailDelivery', tableName: 'mail_deliveries', underscored: true, updatedAt: false },
  );
}
