import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { Role } from '@/lib/contracts/common';
import type { Membership } from './membership';

export class ApiToken extends Model<InferAttributes<ApiToken>, InferCreationAttributes<ApiToken>> {
  declare id: CreationOptional<string>;
  declare membershipId: string;
  declare name: string;
  /** SHA-256 of the token, hexadecimal; the token itself is not kept. */
  declare tokenHash: string;
  declare hint: string;
  /** Never more than the member has at the moment of the request. */
  declare role: Role;
  declare readOnly: CreationOptional<boolean>;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare lastUsedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare membership?: NonAttribute<Membership>;
}

export function initApiToken(sequelize: Sequelize): void {
  ApiToken.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      membershipId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      hint: { type: DataTypes.TEXT, allowNull: false },
      role: { type: DataTypes.TEXT, allowNull: false },
      readOnly: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      revokedAt: DataTypes.DATE,
      lastUsedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'ApiToken', tableName: 'api_tokens', underscored: true },
  );
}
