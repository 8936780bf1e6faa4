import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { ComparisonView } from '@/lib/contracts/comparisons';
import type { Project } from './project';
import type { User } from './user';

/** A comparison kept under a name. */
export class Comparison extends Model<InferAttributes<Comparison>, InferCreationAttributes<Comparison>> {
  declare id: CreationOptional<string>;
  declare projectId: string;
  declare name: string;
  /** As the address writes them: `layout:<id>` or `revision:<id>`. */
  declare sheets: string[];
  declare view: ComparisonView;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;

  declare project?: NonAttribute<Project>;
  declare author?: NonAttribute<User | null>;
}

export function initComparison(sequelize: Sequelize): void {
  Comparison.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      projectId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      sheets: { type: DataTypes.JSONB, allowNull: false },
      view: { type: DataTypes.JSONB, allowNull: false },
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Comparison', tableName: 'comparisons', underscored: true, updatedAt: false },
  );
}
