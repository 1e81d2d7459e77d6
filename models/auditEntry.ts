import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** Who did what, written in the transaction that did it. Only added to. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<string>;
  declare at: CreationOptional<Date>;
  declare actorId: string | null;
  declare companyId: string | null;
  declare jobId: string | null;
  declare action: string;
  /** What it was done to, as table/id. */
  declare subject: string;
  declare detail: Record<string, unknown>;
  declare requestId: string | null;
  declare fromAddress: string | null;
  declare userAgent: string | null;
}

export function initAuditEntry(sequelize: Sequelize): void {
  AuditEntry.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true, autoIncrementIdentity: true },
      at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      actorId: { type: DataTypes.UUID },
      companyId: { type: DataTypes.UUID },
      jobId: { type: DataTypes.UUID },
      action: { type: DataTypes.TEXT, allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      detail: { type: DataTypes.JSONB, allowNull: false },
      requestId: { type: DataTypes.TEXT },
      fromAddress: { type: DataTypes.INET },
      userAgent: { type: DataTypes.TEXT },
    },
    { sequelize, modelName: "auditEntry", tableName: "audit_log", underscored: true, timestamps: false },
  );
}
