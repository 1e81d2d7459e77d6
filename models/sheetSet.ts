import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** The PDF of a revision: a preview for the office, or the sealed bytes. */
export class SheetSet extends Model<InferAttributes<SheetSet>, InferCreationAttributes<SheetSet>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare kind: "preview" | "sealed";
  declare state: "queued" | "drawing" | "ready" | "failed";
  declare objectKey: CreationOptional<string | null>;
  /** SHA-256 of the file, hex: the file digest. It is never printed inside the file. */
  declare digest: CreationOptional<string | null>;
  declare bytes: CreationOptional<number | null>;
  declare sheets: CreationOptional<number | null>;
  declare error: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare finishedAt: CreationOptional<Date | null>;
}

export function initSheetSet(sequelize: Sequelize): void {
  SheetSet.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      objectKey: { type: DataTypes.TEXT },
      digest: { type: DataTypes.TEXT },
      bytes: { type: DataTypes.INTEGER },
      sheets: { type: DataTypes.INTEGER },
      error: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      finishedAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: "sheetSet", tableName: "sheet_sets", underscored: true, updatedAt: false },
  );
}
