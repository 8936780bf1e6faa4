import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { DexterityMap as Answer } from '@/lib/contracts/maps';
import type { MapTile } from './map-tile';

/** One question about one arm and, once computed, its answer; the tiles hold the grid. */
export class DexterityMap extends Model<InferAttributes<DexterityMap>, InferCreationAttributes<DexterityMap>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  /** SHA-256 of the whole question and the kernel's version; unique within the organisation. */
  declare key: string;
  /** The question as the kernel takes it; checked again by the job that reads it. */
  declare input: object;
  declare grid: Answer['grid'];
  declare state: CreationOptional<Answer['state']>;
  /** Each try takes the next number; a write that carries an older one must be refused. */
  declare attempt: CreationOptional<number>;
  declare tileCount: number;
  declare tilesDone: CreationOptional<number>;
  declare summary: CreationOptional<Answer['summary']>;
  declare failure: CreationOptional<string | null>;
  declare askedBy: CreationOptional<string | null>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;
  /** The moment it was asked. */
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare tiles?: NonAttribute<MapTile[]>;
}

export function initDexterityMap(sequelize: Sequelize): void {
  DexterityMap.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      key: { type: DataTypes.TEXT, allowNull: false },
      input: { type: DataTypes.JSONB, allowNull: false },
      grid: { type: DataTypes.JSONB, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
      attempt: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      tileCount: { type: DataTypes.INTEGER, allowNull: false },
      tilesDone: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      summary: DataTypes.JSONB,
      failure: DataTypes.TEXT,
      askedBy: DataTypes.UUID,
      startedAt: DataTypes.DATE,
      finishedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'DexterityMap', tableName: 'dexterity_maps', underscored: true },
  );
}
