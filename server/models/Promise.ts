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

export class Promise extends Model<InferAttributes<Promise>, InferCreationAttributes<Promise>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare visitId: string;
  declare version: number;
  declare date: string;
  declare startMinutes: CreationOptional<number | null>;
  declare endMinutes: CreationOptional<number | null>;
  declare madeAt: Date;
  declare madeBy: string;
}

Promise.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    visitId: DataTypes.STRING,
    version: DataTypes.INTEGER,
    date: DataTypes.DATEONLY,
    startMinutes: DataTypes.INTEGER,
    endMinutes: DataTypes.INTEGER,
    madeAt: DataTypes.DATE(3),
    madeBy: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'promises' },
);
scopeModel(Promise);
