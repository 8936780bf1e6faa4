import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { FloorPlan } from './floor-plan';
import type { Layout } from './layout';
import type { ProjectViewer } from './project-viewer';

export class Project extends Model<InferAttributes<Project>, InferCreationAttributes<Project>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  declare name: string;
  declare customerName: CreationOptional<string>;
  declare siteName: CreationOptional<string>;
  declare archivedAt: CreationOptional<Date | null>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare layouts?: NonAttribute<Layout[]>;
  declare floorPlans?: NonAttribute<FloorPlan[]>;
  declare viewers?: NonAttribute<ProjectViewer[]>;
}

export function initProject(sequelize: Sequelize): void {
  Project.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      customerName: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      siteName: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      archivedAt: DataTypes.DATE,
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Project', tableName: 'projects', underscored: true },
  );
}
