import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import type { Weights } from '#shared/schedule/types.ts';

export class Business extends Model<InferAttributes<Business>, InferCreationAttributes<Business>> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare timeZone: string;
  declare currency: string;
  declare distanceUnit: string;
  declare weightUnit: string;
  declare areaName: CreationOptional<string>;
  declare senderPhone: CreationOptional<string | null>;
  declare deskPhone: CreationOptional<string | null>;
  declare setUpMinutes: CreationOptional<number>;
  declare cleanDownMinutes: CreationOptional<number>;
  declare priceCentsPerHour: CreationOptional<number>;
  declare calloutCents: CreationOptional<number>;
  declare weights: Weights;
  declare isDemo: CreationOptional<boolean>;
  declare createdAt: Date;
}

Business.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    name: DataTypes.STRING,
    timeZone: DataTypes.STRING,
    currency: DataTypes.STRING,
    distanceUnit: DataTypes.STRING,
    weightUnit: DataTypes.STRING,
    areaName: { type: DataTypes.STRING, defaultValue: '' },
    senderPhone: DataTypes.STRING,
    deskPhone: DataTypes.STRING,
    setUpMinutes: { type: DataTypes.INTEGER, defaultValue: 6 },
    cleanDownMinutes: { type: DataTypes.INTEGER, defaultValue: 6 },
    priceCentsPerHour: { type: DataTypes.INTEGER, defaultValue: 0 },
    calloutCents: { type: DataTypes.INTEGER, defaultValue: 0 },
    weights: DataTypes.JSON,
    isDemo: { type: DataTypes.BOOLEAN, defaultValue: false },
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'businesses' },
);
