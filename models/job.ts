import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { Drawing } from "./drawing";
import type { JobMember } from "./jobMember";
import type { Jurisdiction } from "./jurisdiction";
import type { Revision } from "./revision";

/** One site and its drawing. Site data and title block live in the drawing; here is what the register needs. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<string>;
  declare companyId: string;
  declare number: string;
  declare name: string;
  declare jurisdictionId: string | null;
  declare dueOn: string | null;
  declare officeStatus: CreationOptional<"open" | "on hold" | "closed">;
  declare archivedAt: Date | null;
  declare archivedBy: string | null;
  /** In cents; a string, as the driver gives 64-bit numbers. */
  declare permitFeeCents: string | null;
  declare permitFeePaidOn: string | null;
  declare permitReceipt: CreationOptional<string>;
  declare createdBy: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare drawing?: NonAttribute<Drawing>;
  declare members?: NonAttribute<JobMember[]>;
  declare revisions?: NonAttribute<Revision[]>;
  declare jurisdiction?: NonAttribute<Jurisdiction>;
}

export function initJob(sequelize: Sequelize): void {
  Job.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID, allowNull: false },
      number: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      jurisdictionId: { type: DataTypes.UUID },
      dueOn: { type: DataTypes.DATEONLY },
      officeStatus: { type: DataTypes.TEXT, allowNull: false, defaultValue: "open" },
      archivedAt: { type: DataTypes.DATE },
      archivedBy: { type: DataTypes.UUID },
      permitFeeCents: { type: DataTypes.BIGINT },
      permitFeePaidOn: { type: DataTypes.DATEONLY },
      permitReceipt: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
      createdBy: { type: DataTypes.UUID, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "job", tableName: "jobs", underscored: true },
  );
}
