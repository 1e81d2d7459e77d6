import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize } from "sequelize";
import type { Role } from "@/lib/policy";
import type { Company } from "./company";
import type { User } from "./user";

/** A person's roles in a company. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: CreationOptional<string>;
  declare companyId: string;
  declare userId: string;
  declare roles: Role[];
  declare createdAt: CreationOptional<Date>;
  declare company?: NonAttribute<Company>;
  declare user?: NonAttribute<User>;
}

export function initMembership(sequelize: Sequelize): void {
  Membership.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      companyId: { type: DataTypes.UUID, allowNull: false },
      userId: { type: DataTypes.UUID, allowNull: false },
      roles: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "membership", tableName: "memberships", underscored: true, updatedAt: false },
  );
}
