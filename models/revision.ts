import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { LayoutState } from '@/lib/contracts/layouts';
import type { Snapshot } from '@/lib/contracts/revisions';
import type { Layout } from './layout';
import type { SignOff } from './sign-off';
import type { User } from './user';

/** A frozen copy of a layout. Only its state may change; the database refuses everything else. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: CreationOptional<string>;
  declare layoutId: string;
  /** Counts within the layout. */
  declare number: number;
  declare state: CreationOptional<Exclude<LayoutState, 'draft'>>;
  declare note: CreationOptional<string>;
  declare snapshot: Snapshot;
  /** Of the snapshot's canonical JSON. */
  declare sha256: string;
  declare issuedBy: CreationOptional<string | null>;
  /** The moment of issue. */
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare layout?: NonAttribute<Layout>;
  declare issuer?: NonAttribute<User | null>;
  declare signOffs?: NonAttribute<SignOff[]>;
}

export function initRevision(sequelize: Sequelize): void {
  Revision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      layoutId: { type: DataTypes.UUID, allowNull: false },
      number: { type: DataTypes.INTEGER, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'issued' },
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      snapshot: { type: DataTypes.JSONB, allowNull: false },
      sha256: { type: DataTypes.TEXT, allowNull: false },
      issuedBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Revision', tableName: 'revisions', underscored: true },
  );
}
