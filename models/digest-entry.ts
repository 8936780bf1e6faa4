import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** A mail that waits to become a part of the daily one. */
export class DigestEntry extends Model<InferAttributes<DigestEntry>, InferCreationAttributes<DigestEntry>> {
  declare id: string;
  declare email: string;
  declare template: string;
  declare data: Record<string, unknown>;
  /** The daily mail that has taken it. */
  declare digestId: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initDigestEntry(sequelize: Sequelize): void {
  DigestEntry.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      email: { type: DataTypes.TEXT, allowNull: false },
      template: { type: DataTypes.TEXT, allowNull: false },
      data: { type: DataTypes.JSONB, allowNull: false },
      digestId: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'DigestEntry', tableName: 'digest_entries', underscored: true, updatedAt: false },
  );
}
