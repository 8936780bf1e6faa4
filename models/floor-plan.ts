import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { Calibration } from '@/lib/layout/calibration';
import type { Project } from './project';

export type FloorPlanMediaType = 'image/png' | 'image/jpeg' | 'image/webp';

export class FloorPlan extends Model<InferAttributes<FloorPlan>, InferCreationAttributes<FloorPlan>> {
  declare id: CreationOptional<string>;
  declare projectId: string;
  declare name: string;
  /** Size of the upright picture. */
  declare widthPx: number;
  declare heightPx: number;
  /** Folder of the original and of every display size in the object store. */
  declare objectPrefix: string;
  declare originalMediaType: FloorPlanMediaType;
  declare originalBytes: number;
  declare pictureWidths: number[];
  declare calibration: CreationOptional<Calibration | null>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare project?: NonAttribute<Project>;
}

export function initFloorPlan(sequelize: Sequelize): void {
  FloorPlan.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      projectId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      widthPx: { type: DataTypes.INTEGER, allowNull: false },
      heightPx: { type: DataTypes.INTEGER, allowNull: false },
      objectPrefix: { type: DataTypes.TEXT, allowNull: false },
      originalMediaType: { type: DataTypes.TEXT, allowNull: false },
      originalBytes: { type: DataTypes.INTEGER, allowNull: false },
      pictureWidths: { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: false },
      calibration: DataTypes.JSONB,
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'FloorPlan', tableName: 'floor_plans', underscored: true },
  );
}
