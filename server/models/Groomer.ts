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

export class Groomer extends Model<InferAttributes<Groomer>, InferCreationAttributes<Groomer>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare name: string;
  declare skills: string[];
  declare active: CreationOptional<boolean>;
}

Groomer.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    name: DataTypes.STRING,
    skills: DataTypes.JSON,
    active: { type: DataTypes.BOOLEAN, defaultValue: true },
  },
  { sequelize: database, tableName: 'groomers' },
);
scopeModel(Groomer);
