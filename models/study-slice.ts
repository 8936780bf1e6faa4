import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class StudySlice extends Model<InferAttributes<StudySlice>, InferCreationAttributes<StudySlice>> {
  declare studyId: string;
  declare index: number;
  /** The study's attempt that computed it. */
  declare attempt: number;
  declare result: object;
  declare createdAt: CreationOptional<Date>;
}

export function initStudySlice(sequelize: Sequelize): void {
  StudySlice.init(
    {
      studyId: { type: DataTypes.UUID, primaryKey: true },
      index: { type: DataTypes.INTEGER, primaryKey: true },
      attempt: { type: DataTypes.INTEGER, allowNull: false },
      result: { type: DataTypes.JSONB, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'StudySlice', tableName: 'study_slices', underscored: true, updatedAt: false },
  );
}
