import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { LibraryArm } from '@/lib/contracts/arms';

/** One version of an arm. The database refuses to change it: a change is a new version of the same family. */
export class Arm extends Model<InferAttributes<Arm>, InferCreationAttributes<Arm>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  declare familyId: string;
  declare version: number;
  declare name: string;
  declare description: CreationOptional<string>;
  declare payloadKg: CreationOptional<number | null>;
  declare reachMm: number;
  declare definition: LibraryArm['definition'];
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  /** The same for all versions of one arm. */
  declare archivedAt: CreationOptional<Date | null>;
}

export function initArm(sequelize: Sequelize): void {
  Arm.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      familyId: { type: DataTypes.UUID, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      payloadKg: DataTypes.DOUBLE,
      reachMm: { type: DataTypes.DOUBLE, allowNull: false },
      definition: { type: DataTypes.JSONB, allowNull: false },
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      archivedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Arm', tableName: 'arms', underscored: true, updatedAt: false },
  );
}
