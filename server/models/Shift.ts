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

export interface ShiftMeal {
  lengthMinutes: number;
  earliestMinutes: number;
  latestMinutes: number;
  dueAfterMinutes: number;
}

export class Shift extends Model<InferAttributes<Shift>, InferCreationAttributes<Shift>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare date: string;
  declare vanId: string;
  declare groomerId: string;
  declare startMinutes: number;
  declare endMinutes: number;
  declare mostOvertimeMinutes: number;
  declare meal: CreationOptional<ShiftMeal | null>;
}

Shift.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    date: DataTypes.DATEONLY,
    vanId: DataTypes.STRING,
    groomerId: DataTypes.STRING,
    startMinutes: DataTypes.INTEGER,
    endMinutes: DataTypes.INTEGER,
    mostOvertimeMinutes: DataTypes.INTEGER,
    meal: DataTypes.JSON,
  },
  { sequelize: database, tableName: 'shifts' },
);
scopeModel(Shift);
