import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { FixtureContent } from '@/lib/contracts/library-fixtures';

/** A fixture that an organisation keeps to place it again; what stands on a sheet is a copy. */
export class LibraryFixture extends Model<InferAttributes<LibraryFixture>, InferCreationAttributes<LibraryFixture>> {
  declare id: CreationOptional<string>;
  declare organisationId: string;
  declare name: string;
  declare content: FixtureContent;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initLibraryFixture(sequelize: Sequelize): void {
  LibraryFixture.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organisationId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      content: { type: DataTypes.JSONB, allowNull: false },
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'LibraryFixture', tableName: 'library_fixtures', underscored: true },
  );
}
