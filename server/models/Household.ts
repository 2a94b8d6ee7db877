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

export class Household extends Model<
  InferAttributes<Household>,
  InferCreationAttributes<Household>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare name: string;
  declare addressLabel: string;
  declare lat: number;
  declare lon: number;
  declare siteId: CreationOptional<string | null>;
  declare accessNotes: string;
  declare handoverNotes: string;
  declare gateCodeSealed: CreationOptional<string | null>;
  declare contactName: string;
  declare phone: CreationOptional<string | null>;
  declare textsConsent: CreationOptional<boolean>;
  declare consentChangedAt: CreationOptional<Date | null>;
  declare secondContactName: CreationOptional<string>;
  declare secondContactPhone: CreationOptional<string | null>;
  declare createdAt: Date;
}

Household.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    name: DataTypes.STRING,
    addressLabel: DataTypes.STRING,
    lat: DataTypes.DOUBLE,
    lon: DataTypes.DOUBLE,
    siteId: DataTypes.STRING,
    accessNotes: DataTypes.STRING,
    handoverNotes: DataTypes.STRING,
    gateCodeSealed: DataTypes.STRING,
    contactName: DataTypes.STRING,
    phone: DataTypes.STRING,
    textsConsent: { type: DataTypes.BOOLEAN, defaultValue: false },
    consentChangedAt: DataTypes.DATE(3),
    secondContactName: { type: DataTypes.STRING, defaultValue: '' },
    secondContactPhone: DataTypes.STRING,
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'households' },
);
scopeModel(Household);
