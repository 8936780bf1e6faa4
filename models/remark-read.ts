import { DataTypes, Model } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** Until when a member has read a remark and its replies. */
export class RemarkRead extends Model<InferAttributes<RemarkRead>, InferCreationAttributes<RemarkRead>> {
  declare remarkId: string;
  declare userId: string;
  declare readAt: Date;
}

export function initRemarkRead(sequelize: Sequelize): void {
  RemarkRead.init(
    {
      remarkId: { type: DataTypes.UUID, primaryKey: true },
      userId: { type: DataTypes.UUID, primaryKey: true },
      readAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: 'RemarkRead', tableName: 'remark_reads', underscored: true, timestamps: false },
  );
}
