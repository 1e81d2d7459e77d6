import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A licensee's written acceptance of one finding of one revision. */
export class FindingAcceptance extends Model<InferAttributes<FindingAcceptance>, InferCreationAttributes<FindingAcceptance>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare findingKey: string;
  declare reason: string;
  declare acceptedBy: string;
  declare byName: string;
  declare licenseText: string;
  /** YYYY-MM-DD. */
  declare acceptedOn: string;
  declare createdAt: CreationOptional<Date>;
}

export function initFindingAcceptance(sequelize: Sequelize): void {
  FindingAcceptance.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      findingKey: { type: DataTypes.TEXT, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      acceptedBy: { type: DataTypes.UUID, allowNull: false },
      byName: { type: DataTypes.TEXT, allowNull: false },
      licenseText: { type: DataTypes.TEXT, allowNull: false },
      acceptedOn: { type: DataTypes.DATEONLY, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "findingAcceptance", tableName: "finding_acceptances", underscored: true, updatedAt: false },
  );
}
