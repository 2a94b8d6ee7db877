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
import type {
  CoatType,
  FinishLevel,
  PlanB,
  Service,
  Species,
  Style as StyleShape,
} from '#shared/grooming/types.ts';

/** A style of the business's own; the starting library is no row. */
export class Style extends Model<InferAttributes<Style>, InferCreationAttributes<Style>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare name: string;
  declare species: Species;
  declare coats: CoatType[];
  declare cuts: StyleShape['cuts'];
  declare finish: FinishLevel;
  declare services: Service[];
  declare planB: PlanB;
  declare basedOn: CreationOptional<string | null>;
  declare retired: CreationOptional<boolean>;
  declare createdAt: Date;
}

Style.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    name: DataTypes.STRING,
    species: DataTypes.STRING,
    coats: DataTypes.JSON,
    cuts: DataTypes.JSON,
    finish: DataTypes.STRING,
    services: DataTypes.JSON,
    planB: DataTypes.JSON,
    basedOn: DataTypes.STRING,
    retired: { type: DataTypes.BOOLEAN, defaultValue: false },
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'styles' },
);
scopeModel(Style);
