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
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';

export class RunVersion extends Model<
  InferAttributes<RunVersion>,
  InferCreationAttributes<RunVersion>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare runId: string;
  declare version: number;
  declare sentAt: Date;
  declare sentBy: string;
  declare problem: DayProblem;
  declare plan: Plan;
  declare times: DayTimes;
  declare cards: unknown[];
  declare areaVersion: CreationOptional<string | null>;
  declare modelVersion: string;
  declare evaluatorVersion: string;
}

RunVersion.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    runId: DataTypes.STRING,
    version: DataTypes.INTEGER,
    sentAt: DataTypes.DATE(3),
    sentBy: DataTypes.STRING,
    problem: DataTypes.JSON,
    plan: DataTypes.JSON,
    times: DataTypes.JSON,
    cards: DataTypes.JSON,
    areaVersion: DataTypes.STRING,
    modelVersion: DataTypes.STRING,
    evaluatorVersion: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'runVersions' },
);
scopeModel(RunVersion);
