import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { User } from './user';

/** Who has a sheet open just now, and where the pointer is. */
export class Presence extends Model<InferAttributes<Presence>, InferCreationAttributes<Presence>> {
  declare layoutId: string;
  /** One opened page. */
  declare seat: string;
  declare userId: string;
  declare xMm: CreationOptional<number | null>;
  declare yMm: CreationOptional<number | null>;
  declare itemIds: CreationOptional<string[]>;
  declare seenAt: CreationOptional<Date>;

  declare user?: NonAttribute<User>;
}

export function initPresence(sequelize: Sequelize): void {
  Presence.init(
    {
      layoutId: { type: DataTypes.UUID, primaryKey: true },
      seat: { type: DataTypes.UUID, primaryKey: true },
      userId: { type: DataTypes.UUID, allowNull: false },
      xMm: DataTypes.DOUBLE,
      yMm: DataTypes.DOUBLE,
      itemIds: { type: DataTypes.JSONB, allowNull: false, defaultValue: [] },
      seenAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    },
    { sequelize, modelName: 'Presence', tableName: 'presences', underscored: true, timestamps: false },
  );
}
