import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";

/** The drawing being worked on; one a job. */
export class Drawing extends Model<InferAttributes<Drawing>, InferCreationAttributes<Drawing>> {
  declare id: CreationOptional<string>;
  declare jobId: string;
  /** Number of the last save. */
  declare sequence: CreationOptional<number>;
  declare document: DrawingDocument;
  declare checkedSequence: number | null;
  declare checkedRuleSet: string | null;
  declare checkCounts: CheckResult["counts"] | null;
  declare updatedAt: CreationOptional<Date>;
  declare updatedBy: string | null;
}

export function initDrawing(sequelize: Sequelize): void {
  Drawing.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      jobId: { type: DataTypes.UUID, allowNull: false },
      sequence: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      document: { type: DataTypes.JSONB, allowNull: false },
      checkedSequence: { type: DataTypes.INTEGER },
      checkedRuleSet: { type: DataTypes.TEXT },
      checkCounts: { type: DataTypes.JSONB },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
      updatedBy: { type: DataTypes.UUID },
    },
    { sequelize, modelName: "drawing", tableName: "drawings", underscored: true, createdAt: false },
  );
}
