import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { MailRhythm } from '@/lib/contracts/mail-choices';

/** How often an address wants mail; one without a row gets each at once. */
export class MailChoice extends Model<InferAttributes<MailChoice>, InferCreationAttributes<MailChoice>> {
  /** Lower case. */
  declare email: string;
  declare choice: MailRhythm;
  declare updatedAt: CreationOptional<Date>;
}

export function initMailChoice(sequelize: Sequelize): void {
  MailChoice.init(
    {
      email: { type: DataTypes.TEXT, primaryKey: true },
      choice: { type: DataTypes.TEXT, allowNull: false },
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'MailChoice', tableName: 'mail_choices', underscored: true, createdAt: false },
  );
}
