import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { ShareLink } from './share-link';
import type { User } from './user';

export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  declare userId: CreationOptional<string | null>;
  declare shareLinkId: CreationOptional<string | null>;
  /** Subject and deed, such as `member.role_changed`. */
  declare action: string;
  declare subjectId: CreationOptional<string | null>;
  declare details: CreationOptional<Record<string, unknown>>;
  declare createdAt: CreationOptional<Date>;

  declare user?: NonAttribute<User | null>;
  declare shareLink?: NonAttribute<ShareLink | null>;
}

export function initAuditEvent(sequelize: Sequelize): void {
  AuditEvent.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      userId: DataTypes.UUID,
      shareLinkId: DataTypes.UUID,
      action: { type: DataTypes.TEXT, allowNull: false },
      subjectId: DataTypes.UUID,
      details: { type: DataTypes.JSONB, allowNull: false, defaultValue: {} },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'AuditEvent', tableName: 'audit_events', underscored: true, updatedAt: false },
  );
}
