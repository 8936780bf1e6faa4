import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** A picture attached to a remark: made anew from the upload, kept in the object store. */
export class RemarkPicture extends Model<InferAttributes<RemarkPicture>, InferCreationAttributes<RemarkPicture>> {
  declare id: CreationOptional<string>;
  declare remarkId: string;
  declare objectKey: string;
  declare widthPx: number;
  declare heightPx: number;
  declare createdAt: CreationOptional<Date>;
}

export function initRemarkPicture(sequelize: Sequelize): void {
  RemarkPicture.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      remarkId: { type: DataTypes.UUID, allowNull: false },
      objectKey: { type: DataTypes.TEXT, allowNull: false },
      widthPx: { type: DataTypes.INTEGER, allowNull: false },
      heightPx: { type: DataTypes.INTEGER, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'RemarkPicture', tableName: 'remark_pictures', underscored: true, updatedAt: false },
  );
}
