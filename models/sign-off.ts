import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { SignOffDecision } from '@/lib/contracts/sign-offs';
import type { Revision } from './revision';

/** Somebody's yes or no to a revision. The database refuses to change or delete it. */
export class SignOff extends Model<InferAttributes<SignOff>, InferCreationAttributes<SignOff>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  /** Of the content that the signer saw. */
  declare sha256: string;
  declare decision: SignOffDecision;
  declare note: CreationOptional<string>;
  declare userId: CreationOptional<string | null>;
  declare shareLinkId: CreationOptional<string | null>;
  declare signerName: string;
  declare signerEmail: string;
  declare createdAt: CreationOptional<Date>;

  declare revision?: NonAttribute<Revision>;
}

export function initSignOff(sequelize: Sequelize): void {
  SignOff.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      sha256: { type: DataTypes.TEXT, allowNull: false },
      decision: { type: DataTypes.TEXT, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      userId: DataTypes.UUID,
      shareLinkId: DataTypes.UUID,
      signerName: { type: DataTypes.TEXT, allowNull: false },
      signerEmail: { type: DataTypes.TEXT, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'SignOff', tableName: 'sign_offs', underscored: true, updatedAt: false },
  );
}
