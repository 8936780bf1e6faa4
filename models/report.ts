import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { ReportInput, ReportOptions, ReportState } from '@/lib/contracts/reports';
import type { Layout } from './layout';
import type { User } from './user';

export class Report extends Model<InferAttributes<Report>, InferCreationAttributes<Report>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  declare layoutId: string;
  declare revisionId: CreationOptional<string | null>;
  declare options: ReportOptions;
  /** The sheet as it was when the report was asked for. */
  declare input: ReportInput;
  declare state: CreationOptional<ReportState>;
  /** Every write of a result demands that this number still be the current one. */
  declare attempt: CreationOptional<number>;
  declare done: CreationOptional<number>;
  declare total: CreationOptional<number>;
  declare failure: CreationOptional<string | null>;
  declare fileName: string;
  declare objectKey: CreationOptional<string | null>;
  declare bytes: CreationOptional<number | null>;
  declare sha256: CreationOptional<string | null>;
  declare pages: CreationOptional<number | null>;
  declare askedBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare finishedAt: CreationOptional<Date | null>;

  declare layout?: NonAttribute<Layout>;
  declare asker?: NonAttribute<User | null>;
}

export function initReport(sequelize: Sequelize): void {
  Report.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      layoutId: { type: DataTypes.UUID, allowNull: false },
      revisionId: DataTypes.UUID,
      options: { type: DataTypes.JSONB, allowNull: false },
      input: { type: DataTypes.JSONB, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
      attempt: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      done: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      total: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      failure: DataTypes.TEXT,
      fileName: { type: DataTypes.TEXT, allowNull: false },
      objectKey: DataTypes.TEXT,
      bytes: DataTypes.INTEGER,
      sha256: DataTypes.TEXT,
      pages: DataTypes.INTEGER,
      askedBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
      finishedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Report', tableName: 'reports', underscored: true },
  );
}
