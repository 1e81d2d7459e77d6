import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Contact, ExportProfile } from "@/lib/api";
import type { Adoption } from "@/lib/code/adoption";
import type { Requirements, Site } from "@/lib/diagram/schema";
import type { Signer } from "@/lib/workflow";

/** An authority having jurisdiction: what it adopted, what it amended, and how it wants its drawings. */
export class Jurisdiction extends Model<InferAttributes<Jurisdiction>, InferCreationAttributes<Jurisdiction>> {
  declare id: CreationOptional<string>;
  /** Null: known to every company. */
  declare companyId: string | null;
  declare name: string;
  /** The edition in force follows from these and the day. */
  declare editions: Adoption[];
  declare ordinance: CreationOptional<string>;
  declare amendments: Site["amendments"];
  declare signs: CreationOptional<Signer>;
  declare requirements: CreationOptional<Requirements>;
  declare exportProfile: CreationOptional<ExportProfile>;
  declare contacts: CreationOptional<Contact[]>;
  declare notes: CreationOptional<string>;
  declare version: CreationOptional<number>;
  declare updatedBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

export function initJurisdiction(sequelize: Sequelize): void {
  Jurisdiction.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID },
      name: { type: DataTypes.TEXT, allowNull: false },
      editions: { type: DataTypes.JSONB, allowNull: false },
      ordinance: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      amendments: { type: DataTypes.JSONB, allowNull: false },
      // Left out at creation, these take the table's defaults.
      signs: { type: DataTypes.TEXT },
      requirements: { type: DataTypes.JSONB },
      exportProfile: { type: DataTypes.JSONB },
      contacts: { type: DataTypes.JSONB },
      notes: { type: DataTypes.TEXT },
      version: { type: DataTypes.INTEGER },
      updatedBy: { type: DataTypes.UUID },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "jurisdiction", tableName: "jurisdictions", underscored: true },
  );
}
