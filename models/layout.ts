import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { MapSettings } from '@/lib/layout/map-settings';
import type { FloorPlan } from './floor-plan';
import type { LayoutItem } from './layout-item';
import type { Project } from './project';
import type { Revision } from './revision';

export class Layout extends Model<InferAttributes<Layout>, InferCreationAttributes<Layout>> {
  declare id: CreationOptional<string>;
  declare projectId: string;
  /** A, B, … within the project. */
  declare letter: string;
  declare name: string;
  /** Counts every accepted batch of edits. */
  declare version: CreationOptional<number>;
  declare floorPlanId: CreationOptional<string | null>;
  declare mapSettings: MapSettings;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare project?: NonAttribute<Project>;
  declare floorPlan?: NonAttribute<FloorPlan | null>;
  declare items?: NonAttribute<LayoutItem[]>;
  declare revisions?: NonAttribute<Revision[]>;
}

export function initLayout(sequelize: Sequelize): void {
  Layout.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      projectId: { type: DataTypes.UUID, allowNull: false },
      letter: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      floorPlanId: DataTypes.UUID,
      mapSettings: { type: DataTypes.JSONB, allowNull: false },
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    // `version` is our own counter of edits, not Sequelize's optimistic lock.
    { sequelize, modelName: 'Layout', tableName: 'layouts', underscored: true, version: false },
  );
}
