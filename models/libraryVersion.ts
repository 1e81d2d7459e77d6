import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { LibraryData } from "@/lib/api";
import type { User } from "./user";

/** What an entry held from one change to the next. Never changed: drawings refer to it. */
export class LibraryVersion extends Model<InferAttributes<LibraryVersion>, InferCreationAttributes<LibraryVersion>> {
  declare entryId: string;
  declare version: number;
  declare data: LibraryData;
  declare note: CreationOptional<string>;
  /** Null: made with the company. */
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare maker?: NonAttribute<User>;
}

export function initLibraryVersion(sequelize: Sequelize): void {
  LibraryVersion.init(
    {
      entryId: { type: DataTypes.UUID, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      data: { type: DataTypes.JSONB, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      madeBy: { type: DataTypes.UUID },
      madeAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    },
    { sequelize, modelName: "libraryVersion", tableName: "library_versions", underscored: true, timestamps: false },
  );
}
