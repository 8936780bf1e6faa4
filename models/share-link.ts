import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { Revision } from './revision';
import type { ShareOpen } from './share-open';

export class ShareLink extends Model<InferAttributes<ShareLink>, InferCreationAttributes<ShareLink>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  /** SHA-256 of the token, hexadecimal; the token itself is not kept. */
  declare tokenHash: string;
  declare label: CreationOptional<string>;
  declare mayRemark: CreationOptional<boolean>;
  declare maySign: CreationOptional<boolean>;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare openCount: CreationOptional<number>;
  declare lastOpenedAt: CreationOptional<Date | null>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare revision?: NonAttribute<Revision>;
  declare opens?: NonAttribute<ShareOpen[]>;
}

export function initShareLink(sequelize: Sequelize): void {
  ShareLink.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      label: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      mayRemark: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: true },
      maySign: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      revokedAt: DataTypes.DATE,
      openCount: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      lastOpenedAt: DataTypes.DATE,
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'ShareLink', tableName: 'share_links', underscored: true },
  );
}
