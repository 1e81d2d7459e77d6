import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { FilePurpose, FileType } from "@/lib/api/files";
import type { User } from "./user";

/** A file of a job, of a library entry or of the company. The bytes are in the store under `objectKey`, shared by equal files. */
export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
  declare id: CreationOptional<string>;
  declare companyId: string;
  declare jobId: CreationOptional<string | null>;
  declare libraryEntryId: CreationOptional<string | null>;
  declare purpose: FilePurpose;
  declare name: string;
  declare contentType: FileType;
  declare bytes: number;
  /** SHA-256 of the stored bytes, hex. */
  declare digest: string;
  declare objectKey: string;
  declare widthPx: CreationOptional<number | null>;
  declare heightPx: CreationOptional<number | null>;
  declare pages: CreationOptional<number | null>;
  declare uploadedBy: string;
  declare uploadedAt: CreationOptional<Date>;
  declare removedAt: CreationOptional<Date | null>;
  declare removedBy: CreationOptional<string | null>;
  declare uploader?: NonAttribute<User>;
}

export function initStoredFile(sequelize: Sequelize): void {
  StoredFile.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID, allowNull: false },
      jobId: { type: DataTypes.UUID },
      libraryEntryId: { type: DataTypes.UUID },
      purpose: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      contentType: { type: DataTypes.TEXT, allowNull: false },
      bytes: { type: DataTypes.INTEGER, allowNull: false },
      digest: { type: DataTypes.TEXT, allowNull: false },
      objectKey: { type: DataTypes.TEXT, allowNull: false },
      widthPx: { type: DataTypes.INTEGER },
      heightPx: { type: DataTypes.INTEGER },
      pages: { type: DataTypes.INTEGER },
      uploadedBy: { type: DataTypes.UUID, allowNull: false },
      uploadedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      removedAt: { type: DataTypes.DATE },
      removedBy: { type: DataTypes.UUID },
    },
    { sequelize, modelName: "storedFile", tableName: "stored_files", underscored: true, timestamps: false },
  );
}
