import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Edition, Site } from "@/lib/diagram/schema";

/** An authority having jurisdiction: what it adopted and what it amended. */
export class Jurisdiction extends Model<InferAttributes<Jurisdiction>, InferCreationAttributes<Jurisdiction>> {
  declare id: CreationOptional<string>;
  /** Null: known to every company. */
  declare companyId: string | null;
  declare name: string;
  declare edition: Edition;
  declare ordinance: CreationOptional<string>;
  declare amendments: Site["amendments"];
  declare createdAt: CreationOptional<Date>;
}

export function initJurisdiction(sequelize: Sequelize): void {
  Jurisdiction.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID },
      name: { type: DataTypes.TEXT, allowNull: false },
      edition: { type: DataTypes.TEXT, allowNull: false },
      ordinance: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      amendments: { type: DataTypes.JSONB, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "jurisdiction", tableName: "jurisdictions", underscored: true, updatedAt: false },
  );
}
