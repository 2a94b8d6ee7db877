import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { scopeModel } from '#server/db/scopeModel.ts';

/** A photo of a version of a pet's style; the file is in the data folder. */
export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare petStyleId: string;
  declare fileName: string;
  declare bytes: number;
  declare width: number;
  declare height: number;
  declare sha256: string;
  declare takenAt: Date;
}

Photo.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    petStyleId: DataTypes.STRING,
    fileName: DataTypes.STRING,
    bytes: DataTypes.INTEGER,
    width: DataTypes.INTEGER,
    height: DataTypes.INTEGER,
    sha256: DataTypes.STRING,
    takenAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'photos' },
);
scopeModel(Photo);
