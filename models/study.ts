import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Study as Answer } from '@/lib/contracts/studies';

/** One question of where things may stand and, once worked out, its answer. */
export class Study extends Model<InferAttributes<Study>, InferCreationAttributes<Study>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  /** SHA-256 of the whole question, the arm and the kernel's version; unique within the organisation. */
  declare key: string;
  /** The question with the arm's definition; checked again by the job that reads it. */
  declare input: object;
  declare state: CreationOptional<Answer['state']>;
  /** Each try takes the next number; a write that carries an older one must be refused. */
  declare attempt: CreationOptional<number>;
  declare sliceCount: number;
  declare slicesDone: CreationOptional<number>;
  declare answer: CreationOptional<Answer['answer']>;
  declare failure: CreationOptional<string | null>;
  declare askedBy: CreationOptional<string | null>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;
  /** The moment it was asked. */
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initStudy(sequelize: Sequelize): void {
  Study.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      key: { type: DataTypes.TEXT, allowNull: false },
      input: { type: DataTypes.JSONB, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
      attempt: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      sliceCount: { type: DataTypes.INTEGER, allowNull: false },
      slicesDone: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      answer: DataTypes.JSONB,
      failure: DataTypes.TEXT,
      askedBy: DataTypes.UUID,
      startedAt: DataTypes.DATE,
      finishedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Study', tableName: 'studies', underscored: true },
  );
}
