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
import type { PlanB, Service, Style } from '#shared/grooming/types.ts';

/** One version of a pet's style. Rows are only added; the highest version counts. */
export class PetStyle extends Model<InferAttributes<PetStyle>, InferCreationAttributes<PetStyle>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare petId: string;
  declare version: number;
  declare styleId: string;
  declare ownCuts: CreationOptional<Style['cuts'] | null>;
  declare ownFinish: CreationOptional<Style['finish'] | null>;
  declare ownServices: CreationOptional<Service[] | null>;
  declare ownPlanB: CreationOptional<PlanB | null>;
  declare notes: string;
  declare madeAt: CreationOptional<Date | null>;
  declare madeBy: string;
}

PetStyle.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    petId: DataTypes.STRING,
    version: DataTypes.INTEGER,
    styleId: DataTypes.STRING,
    ownCuts: DataTypes.JSON,
    ownFinish: DataTypes.STRING,
    ownServices: DataTypes.JSON,
    ownPlanB: DataTypes.JSON,
    notes: DataTypes.STRING,
    madeAt: DataTypes.DATE(3),
    madeBy: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'petStyles' },
);
scopeModel(PetStyle);
