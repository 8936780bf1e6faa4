import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { AuthorSide, Remark } from './remark';
import type { User } from './user';

export class RemarkReply extends Model<InferAttributes<RemarkReply>, InferCreationAttributes<RemarkReply>> {
  declare id: CreationOptional<string>;
  declare remarkId: string;
  declare body: string;
  declare userId: CreationOptional<string | null>;
  declare guestName: CreationOptional<string | null>;
  declare guestEmail: CreationOptional<string | null>;
  declare shareLinkId: CreationOptional<string | null>;
  declare authorSide: AuthorSide;
  declare createdAt: CreationOptional<Date>;

  declare remark?: NonAttribute<Remark>;
  declare user?: NonAttribute<User | null>;
}

export function initRemarkReply(sequelize: Sequelize): void {
  RemarkReply.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      remarkId: { type: DataTypes.UUID, allowNull: false },
      body: { type: DataTypes.TEXT, allowNull: false },
      userId: DataTypes.UUID,
      guestName: DataTypes.TEXT,
      guestEmail: DataTypes.TEXT,
      shareLinkId: DataTypes.UUID,
      authorSide: { type: DataTypes.TEXT, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'RemarkReply', tableName: 'remark_replies', underscored: true, updatedAt: false },
  );
}
