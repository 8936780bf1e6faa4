import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, NonAttribute, Sequelize } from 'sequelize';
import type { Item, ItemKind } from '@/lib/layout/items';
import type { Layout } from './layout';

/** A thing on a sheet. Its id comes from the client and is unique within its layout. */
export class LayoutItem extends Model<InferAttributes<LayoutItem>, InferCreationAttributes<LayoutItem>> {
  declare layoutId: string;
  declare id: string;
  /** The version that the next edit must name. */
  declare version: number;
  declare kind: ItemKind;
  declare data: Item;
  /** The layout's version at the item's last change. */
  declare layoutVersion: number;
  /** Set on a removed item, which stays so that others learn of the removal. */
  declare removedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  declare layout?: NonAttribute<Layout>;
}

export function initLayoutItem(sequelize: Sequelize): void {
  LayoutItem.init(
    {
      layoutId: { type: DataTypes.UUID, primaryKey: true },
      id: { type: DataTypes.UUID, primaryKey: true },
      version: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      data: { type: DataTypes.JSONB, allowNull: false },
      layoutVersion: { type: DataTypes.INTEGER, allowNull: false },
      removedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'LayoutItem', tableName: 'items', underscored: true, version: false },
  );
}
