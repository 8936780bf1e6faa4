import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { Membership } from './membership';
import type { Project } from './project';

/** One project that one viewer may look at. The organisation is named so that the database can refuse a grant across two. */
export class ProjectViewer extends Model<InferAttributes<ProjectViewer>, InferCreationAttributes<ProjectViewer>> {
  declare projectId: string;
  declare membershipId: string;
  declare organisationId: string;
  declare createdAt: CreationOptional<Date>;

  declare project?: NonAttribute<Project>;
  declare membership?: NonAttribute<Membership>;
}

export function initProjectViewer(sequelize: Sequelize): void {
  ProjectViewer.init(
    {
      projectId: { type: DataTypes.UUID, primaryKey: true },
      membershipId: { type: DataTypes.UUID, primaryKey: true },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'ProjectViewer', tableName: 'project_viewers', underscored: true, updatedAt: false },
  );
}
