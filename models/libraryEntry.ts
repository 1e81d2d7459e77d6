import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { LibraryVersion } from "./libraryVersion";

/** Equipment a company installs. What it holds stands in its versions. */
export class LibraryEntry extends Model<InferAttributes<LibraryEntry>, InferCreationAttributes<LibraryEntry>> {
  declare id: CreationOptional<string>;
  declare companyId: string;
  declare kind: string;
  declare name: string;
  declare make: string;
  declare model: string;
  declare currentVersion: number;
  declare starter: CreationOptional<boolean>;
  declare archivedAt: CreationOptional<Date | null>;
  /** Null: made with the company. */
  declare createdBy: string | null;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare versions?: NonAttribute<LibraryVersion[]>;
}

export function initLibraryEntry(sequelize: Sequelize): void {
  LibraryEntry.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      make: { type: DataTypes.TEXT, allowNull: false },
      model: { type: DataTypes.TEXT, allowNull: false },
      currentVersion: { type: DataTypes.INTEGER, allowNull: false },
      starter: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      archivedAt: { type: DataTypes.DATE },
      createdBy: { type: DataTypes.UUID },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "libraryEntry", tableName: "library_entries", underscored: true },
  );
}
