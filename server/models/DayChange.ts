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
import type { Move, Plan } from '#shared/schedule/types.ts';

export class DayChange extends Model<
  InferAttributes<DayChange>,
  InferCreationAttributes<DayChange>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare dayId: string;
  declare seq: number;
  declare at: Date;
  declare userId: CreationOptional<string | null>;
  declare who: string;
  declare kind: string;
  declare words: string;
  declare move: CreationOptional<Move | null>;
  declare before: CreationOptional<Plan | null>;
  declare after: CreationOptional<Plan | null>;
  declare undoneAt: CreationOptional<Date | null>;
  declare undoes: CreationOptional<string | null>;
}

DayChange.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    dayId: DataTypes.STRING,
    seq: DataTypes.INTEGER,
    at: DataTypes.DATE(3),
    userId: DataTypes.STRING,
    who: DataTypes.STRING,
    kind: DataTypes.STRING,
    words: DataTypes.STRING,
    move: DataTypes.JSON,
    before: DataTypes.JSON,
    after: DataTypes.JSON,
    undoneAt: DataTypes.DATE(3),
    undoes: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'dayChanges' },
);
scopeModel(DayChange);
