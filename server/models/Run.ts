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
import type { Stop } from '#shared/schedule/types.ts';

export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare date: string;
  declare vanId: string;
  declare groomerId: string;
  declare version: CreationOptional<number>;
  declare stops: Stop[];
  declare sentVersion: CreationOptional<number | null>;
  declare sentAt: CreationOptional<Date | null>;
  declare draftVersionSent: CreationOptional<number | null>;
}

Run.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    date: DataTypes.DATEONLY,
    vanId: DataTypes.STRING,
    groomerId: DataTypes.STRING,
    version: { type: DataTypes.INTEGER, defaultValue: 1 },
    stops: DataTypes.JSON,
    sentVersion: DataTypes.INTEGER,
    sentAt: DataTypes.DATE(3),
    draftVersionSent: DataTypes.INTEGER,
  },
  { sequelize: database, tableName: 'runs' },
);
scopeModel(Run);
