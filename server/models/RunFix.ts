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

export class RunFix extends Model<InferAttributes<RunFix>, InferCreationAttributes<RunFix>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare runId: string;
  declare lat: number;
  declare lon: number;
  declare at: Date;
  declare accuracyMetres: number;
}

RunFix.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    runId: DataTypes.STRING,
    lat: DataTypes.DOUBLE,
    lon: DataTypes.DOUBLE,
    at: DataTypes.DATE(3),
    accuracyMetres: DataTypes.INTEGER,
  },
  { sequelize: database, tableName: 'runFixes' },
);
scopeModel(RunFix);
