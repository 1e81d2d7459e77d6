import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A design office or installer. */
export class Company extends Model<InferAttributes<Company>, InferCreationAttributes<Company>> {
  declare id: CreationOptional<string>;
  declare name: string;
  /** How job numbers are made, for example {yy}-{nnn}. */
  declare jobNumberScheme: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
}

export function initCompany(sequelize: Sequelize): void {
  Company.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      name: { type: DataTypes.TEXT, allowNull: false },
      jobNumberScheme: { type: DataTypes.TEXT, allowNull: false, defaultValue: "{yy}-{nnn}" },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "company", tableName: "companies", underscored: true, updatedAt: false },
  );
}
