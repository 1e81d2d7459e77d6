import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { VisitData } from "@/lib/diagram/siteVisit";
import type { User } from "./user";

/** What was gathered at the site on one day. The drawing takes from it only what somebody takes over. */
export class SiteVisit extends Model<InferAttributes<SiteVisit>, InferCreationAttributes<SiteVisit>> {
  declare id: string;
  declare jobId: string;
  declare visitedOn: string;
  declare byName: string;
  declare data: VisitData;
  declare version: CreationOptional<number>;
  declare createdBy: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedBy: string;
  declare updatedAt: CreationOptional<Date>;
  declare creator?: NonAttribute<User>;
  declare updater?: NonAttribute<User>;
}

export function initSiteVisit(sequelize: Sequelize): void {
  SiteVisit.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, allowNull: false },
      visitedOn: { type: DataTypes.DATEONLY, allowNull: false },
      byName: { type: DataTypes.TEXT, allowNull: false },
      data: { type: DataTypes.JSONB, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      createdBy: { type: DataTypes.UUID, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedBy: { type: DataTypes.UUID, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "siteVisit", tableName: "site_visits", underscored: true },
  );
}
