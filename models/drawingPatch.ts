import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { PatchOperation } from "@/lib/rules/engine/types";
import type { User } from "./user";

/** One save in a drawing's journal. */
export class DrawingPatch extends Model<InferAttributes<DrawingPatch>, InferCreationAttributes<DrawingPatch>> {
  declare id: CreationOptional<string>;
  declare drawingId: string;
  declare sequence: number;
  declare saveId: string;
  declare baseSequence: number;
  declare authorId: string;
  declare title: string;
  declare patches: PatchOperation[];
  declare createdAt: CreationOptional<Date>;
  declare author?: NonAttribute<User>;
}

export function initDrawingPatch(sequelize: Sequelize): void {
  DrawingPatch.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true, autoIncrementIdentity: true },
      drawingId: { type: DataTypes.UUID, allowNull: false },
      sequence: { type: DataTypes.INTEGER, allowNull: false },
      saveId: { type: DataTypes.UUID, allowNull: false },
      baseSequence: { type: DataTypes.INTEGER, allowNull: false },
      authorId: { type: DataTypes.UUID, allowNull: false },
      title: { type: DataTypes.TEXT, allowNull: false },
      patches: { type: DataTypes.JSONB, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "drawingPatch", tableName: "drawing_patches", underscored: true, updatedAt: false },
  );
}
