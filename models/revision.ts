import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { IssuedJurisdiction, RevisionState } from "@/lib/workflow";
import type { FindingAcceptance } from "./findingAcceptance";
import type { Job } from "./job";
import type { Seal } from "./seal";
import type { SheetSet } from "./sheetSet";
import type { User } from "./user";

/** A drawing as it was issued. The database refuses a change of what was issued. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: CreationOptional<string>;
  declare jobId: string;
  declare drawingId: string;
  declare letter: string;
  declare issue: number;
  declare purpose: string;
  declare description: string;
  declare state: RevisionState;
  declare sequence: number;
  declare snapshot: DrawingDocument;
  declare digest: string;
  declare ruleSet: string;
  declare checkResult: CheckResult;
  /** What the authority asked for on the day of issue; null where the job had none. */
  declare jurisdiction: CreationOptional<IssuedJurisdiction | null>;
  declare issuedBy: string;
  declare issuedAt: CreationOptional<Date>;
  declare returnedBy: CreationOptional<string | null>;
  declare returnedAt: CreationOptional<Date | null>;
  declare returnComment: CreationOptional<string | null>;
  declare voidedAt: CreationOptional<Date | null>;
  declare supersededAt: CreationOptional<Date | null>;
  declare issuer?: NonAttribute<User>;
  declare returner?: NonAttribute<User | null>;
  declare job?: NonAttribute<Job>;
  declare seal?: NonAttribute<Seal | null>;
  declare sheetSets?: NonAttribute<SheetSet[]>;
  declare acceptances?: NonAttribute<FindingAcceptance[]>;
}

export function initRevision(sequelize: Sequelize): void {
  Revision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      jobId: { type: DataTypes.UUID, allowNull: false },
      drawingId: { type: DataTypes.UUID, allowNull: false },
      letter: { type: DataTypes.TEXT, allowNull: false },
      issue: { type: DataTypes.INTEGER, allowNull: false },
      purpose: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      sequence: { type: DataTypes.INTEGER, allowNull: false },
      snapshot: { type: DataTypes.JSONB, allowNull: false },
      digest: { type: DataTypes.TEXT, allowNull: false },
      ruleSet: { type: DataTypes.TEXT, allowNull: false },
      checkResult: { type: DataTypes.JSONB, allowNull: false },
      jurisdiction: { type: DataTypes.JSONB },
      issuedBy: { type: DataTypes.UUID, allowNull: false },
      issuedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      returnedBy: { type: DataTypes.UUID },
      returnedAt: { type: DataTypes.DATE },
      returnComment: { type: DataTypes.TEXT },
      voidedAt: { type: DataTypes.DATE },
      supersededAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: "revision", tableName: "revisions", underscored: true, timestamps: false },
  );
}
