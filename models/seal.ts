import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A licensee's seal on a revision, with the license as it was on the day. */
export class Seal extends Model<InferAttributes<Seal>, InferCreationAttributes<Seal>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare sealedBy: string;
  declare licenseeName: string;
  declare licenseState: string;
  declare licenseNumber: string;
  declare licenseTitle: string;
  declare licenseExpiresOn: string;
  declare sealObjectKey: string;
  /** Short code printed on the sheets, for example F7K2-91QD. */
  declare sealCode: string;
  declare sealedAt: Date;
  /** When the sealed bytes were stored; null while the sheets are being drawn. */
  declare completedAt: CreationOptional<Date | null>;
}

export function initSeal(sequelize: Sequelize): void {
  Seal.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      revisionId: { type: DataTypes.UUID, allowNull: false },
      sealedBy: { type: DataTypes.UUID, allowNull: false },
      licenseeName: { type: DataTypes.TEXT, allowNull: false },
      licenseState: { type: DataTypes.TEXT, allowNull: false },
      licenseNumber: { type: DataTypes.TEXT, allowNull: false },
      licenseTitle: { type: DataTypes.TEXT, allowNull: false },
      licenseExpiresOn: { type: DataTypes.DATEONLY, allowNull: false },
      sealObjectKey: { type: DataTypes.TEXT, allowNull: false },
      sealCode: { type: DataTypes.TEXT, allowNull: false },
      sealedAt: { type: DataTypes.DATE, allowNull: false },
      completedAt: { type: DataTypes.DATE },
    },
    { sequelize, modelName: "seal", tableName: "seals", underscored: true, timestamps: false },
  );
}
