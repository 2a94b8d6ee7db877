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

export class Day extends Model<InferAttributes<Day>, InferCreationAttributes<Day>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare date: string;
  declare version: CreationOptional<number>;
}

Day.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    date: DataTypes.DATEONLY,
    version: { type: DataTypes.INTEGER, defaultValue: 1 },
  },
  { sequelize: database, tableName: 'days' },
);
scopeModel(Day);
