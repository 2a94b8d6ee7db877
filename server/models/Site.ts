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

export class Site extends Model<InferAttributes<Site>, InferCreationAttributes<Site>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare name: string;
  declare lat: number;
  declare lon: number;
  declare parkingNotes: string;
  declare gateCodeSealed: CreationOptional<string | null>;
}

Site.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    name: DataTypes.STRING,
    lat: DataTypes.DOUBLE,
    lon: DataTypes.DOUBLE,
    parkingNotes: DataTypes.STRING,
    gateCodeSealed: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'sites' },
);
scopeModel(Site);
