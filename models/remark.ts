import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { RemarkMention } from './remark-mention';
import type { RemarkPicture } from './remark-picture';
import type { RemarkRead } from './remark-read';
import type { RemarkReply } from './remark-reply';
import type { Revision } from './revision';
import type { User } from './user';

export type AuthorSide = 'integrator' | 'customer';

/** A comment pinned to a spot of a revision. Its author is a member (userId) or a guest of a share link (the guest fields). */
export class Remark extends Model<InferAttributes<Remark>, InferCreationAttributes<Remark>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare layoutId: string;
  /** Counts within the layout. */
  declare number: number;
  declare xMm: number;
  declare yMm: number;
  declare itemId: CreationOptional<string | null>;
  declare body: string;
  declare userId: CreationOptional<string | null>;
  declare guestName: CreationOptional<string | null>;
  declare guestEmail: CreationOptional<string | null>;
  declare shareLinkId: CreationOptional<string | null>;
  /** As it was when they wrote: roles change later. */
  declare authorSide: AuthorSide;
  /** Whose it is to deal with, a member, and until when (ISO date). */
  declare assigneeId: CreationOptional<string | null>;
  declare dueOn: CreationOptional<string | null>;
  declare resolvedAt: CreationOptional<Date | null>;
  declare resolvedBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare revision?: NonAttribute<Revision>;
  declare user?: NonAttribute<User | null>;
  declare replies?: NonAttribute<RemarkReply[]>;
  declare assignee?: NonAttribute<User | null>;
  declare mentions?: NonAttribute<RemarkMention[]>;
  declare pictures?: NonAttribute<RemarkPicture[]>;
  declare reads?: NonAttribute<RemarkRead[]>;
}

export function initRemark(sequelize: Sequelize): void {
  Remark.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      layoutId: { type: DataTypes.UUID, allowNull: false },
      number: { type: DataTypes.INTEGER, allowNull: false },
      xMm: { type: DataTypes.DOUBLE, allowNull: false },
      yMm: { type: DataTypes.DOUBLE, allowNull: false },
      itemId: DataTypes.UUID,
      body: { type: DataTypes.TEXT, allowNull: false },
      userId: DataTypes.UUID,
      guestName: DataTypes.TEXT,
      guestEmail: DataTypes.TEXT,
      shareLinkId: DataTypes.UUID,
      authorSide: { type: DataTypes.TEXT, allowNull: false },
      assigneeId: DataTypes.UUID,
      dueOn: DataTypes.DATEONLY,
      resolvedAt: DataTypes.DATE,
      resolvedBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Remark', tableName: 'remarks', underscored: true },
  );
}
