import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

export class MapTile extends Model<InferAttributes<MapTile>, InferCreationAttributes<MapTile>> {
  declare mapId: string;
  declare index: number;
  /** The map's attempt that computed it. */
  declare attempt: number;
  declare bytes: Buffer;
  declare createdAt: CreationOptional<Date>;
}

export function initMapTile(sequelize: Sequelize): void {
  MapTile.init(
    {
      mapId: { type: DataTypes.UUID, primaryKey: true },
      index: { type: DataTypes.INTEGER, primaryKey: true },
      attempt: { type: DataTypes.INTEGER, allowNull: false },
      bytes: { type: DataTypes.BLOB, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'MapTile', tableName: 'map_tiles', underscored: true, updatedAt: false },
  );
}
