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

export type PlaceKind = 'depot' | 'waterFill' | 'waterDump' | 'fillAndDump' | 'emergencyVet';

export class Place extends Model<InferAttributes<Place>, InferCreationAttributes<Place>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare kind: PlaceKind;
  declare name: string;
  declare addressLabel: string;
  declare lat: number;
  declare lon: number;
  declare phone: CreationOptional<string | null>;
  declare opensMinutes: number;
  declare closesMinutes: number;
  declare lengthMinutes: number;
}

Place.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    kind: DataTypes.STRING,
    name: DataTypes.STRING,
    addressLabel: DataTypes.STRING,
    lat: DataTypes.DOUBLE,
    lon: DataTypes.DOUBLE,
    phone: DataTypes.STRING,
    opensMinutes: DataTypes.INTEGER,
    closesMinutes: DataTypes.INTEGER,
    lengthMinutes: DataTypes.INTEGER,
  },
  { sequelize: database, tableName: 'places' },
);
scopeModel(Place);
