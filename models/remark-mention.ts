import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { User } from './user';

/** A member named in a remark, or in one of its replies. */
export class RemarkMention extends Model<InferAttributes<RemarkMention>, InferCreationAttributes<RemarkMention>> {
  declare id: CreationOptional<string>;
  declare remarkId: string;
  declare replyId: CreationOptional<string | null>;
  declare userId: string;
  declare createdAt: CreationOptional<Date>;

  declare user?: NonAttribute<User>;
}

export function initRemarkMention(sequelize: Sequelize): void {
  RemarkMention.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      remarkId: { type: DataTypes.UUID, allowNull: false },
      replyId: DataTypes.UUID,
      userId: { type: DataTypes.UUID, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'RemarkMention', tableName: 'remark_mentions', underscored: true, updatedAt: false },
  );
}
