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

export class OptOut extends Model<InferAttributes<OptOut>, InferCreationAttributes<OptOut>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare sender: string;
  declare phone: string;
  declare at: Date;
}

OptOut.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    sender: DataTypes.STRING,
    phone: DataTypes.STRING,
    at: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'optOuts' },
);
scopeModel(OptOut);
