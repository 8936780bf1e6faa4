import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Operation, OperationResult } from '@/lib/contracts/layouts';

/** An accepted batch of edits under the id its client gave it: sent again, it is answered from here. */
export class LayoutOperation extends Model<InferAttributes<LayoutOperation>, InferCreationAttributes<LayoutOperation>> {
  declare layoutId: string;
  declare id: string;
  declare userId: string | null;
  declare layoutVersion: number;
  declare operations: Operation[];
  declare result: OperationResult;
  declare createdAt: CreationOptional<Date>;
}

export function initLayoutOperation(sequelize: Sequelize): void {
  LayoutOperation.init(
    {
      layoutId: { type: DataTypes.UUID, primaryKey: true },
      id: { type: DataTypes.UUID, primaryKey: true },
      userId: DataTypes.UUID,
      layoutVersion: { type: DataTypes.INTEGER, allowNull: false },
      operations: { type: DataTypes.JSONB, allowNull: false },
      result: { type: DataTypes.JSONB, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'LayoutOperation', tableName: 'layout_operations', underscored: true, updatedAt: false },
  );
}
