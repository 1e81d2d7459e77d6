import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { Role } from "@/lib/policy";
import type { Job } from "./job";
import type { User } from "./user";

/** A person's roles in one job; the person need not belong to the company. */
export class JobMember extends Model<InferAttributes<JobMember>, InferCreationAttributes<JobMember>> {
  declare id: CreationOptional<string>;
  declare jobId: string;
  declare userId: string;
  declare roles: Role[];
  declare createdAt: CreationOptional<Date>;
  declare user?: NonAttribute<User>;
  declare job?: NonAttribute<Job>;
}

export function initJobMember(sequelize: Sequelize): void {
  JobMember.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      jobId: { type: DataTypes.UUID, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      roles: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "jobMember", tableName: "job_members", underscored: true, updatedAt: false },
  );
}
