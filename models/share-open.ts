import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export type Device = 'phone' | 'tablet' | 'computer' | 'program';

/** One opening of a share link. */
export class ShareOpen extends Model<InferAttributes<ShareOpen>, InferCreationAttributes<ShareOpen>> {
  declare id: CreationOptional<string>;
  declare shareLinkId: string;
  declare guestName: CreationOptional<string | null>;
  declare guestEmail: CreationOptional<string | null>;
  declare device: Device;
  declare createdAt: CreationOptional<Date>;
}

export function initShareOpen(sequelize: Sequelize): void {
  ShareOpen.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      shareLinkId: { type: DataTypes.UUID, allowNull: false },
      guestName: DataTypes.TEXT,
      guestEmail: DataTypes.TEXT,
      device: { type: DataTypes.TEXT, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'ShareOpen', tableName: 'share_opens', underscored: true, updatedAt: false },
  );
}
