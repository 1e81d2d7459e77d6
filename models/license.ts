import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A person's license to seal. */
export class License extends Model<InferAttributes<License>, InferCreationAttributes<License>> {
  declare id: CreationOptional<string>;
  declare userId: string;
  declare state: string;
  declare number: string;
  declare title: string;
  /** Last day on which it is in force, YYYY-MM-DD. */
  declare expiresOn: string;
  declare sealObjectKey: string | null;
  declare sealWidthPx: number | null;
  declare sealHeightPx: number | null;
  declare updatedAt: CreationOptional<Date>;
}

export function initLicense(sequelize: Sequelize): void {
  License.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: { type: DataTypes.UUID, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      number: { type: DataTypes.TEXT, allowNull: false },
      title: { type: DataTypes.TEXT, allowNull: false },
      expiresOn: { type: DataTypes.DATEONLY, allowNull: false },
      sealObjectKey: { type: DataTypes.TEXT },
      sealWidthPx: { type: DataTypes.INTEGER },
      sealHeightPx: { type: DataTypes.INTEGER },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    { sequelize, modelName: "license", tableName: "licenses", underscored: true, createdAt: false },
  );
}
