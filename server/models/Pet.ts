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
import type { CoatState } from '#shared/grooming/types.ts';

export type Species = 'dog' | 'cat';

export class Pet extends Model<InferAttributes<Pet>, InferCreationAttributes<Pet>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare householdId: string;
  declare name: string;
  declare species: Species;
  declare breedId: CreationOptional<string | null>;
  declare weightGrams: CreationOptional<number | null>;
  declare coatType: CreationOptional<string | null>;
  declare matting: number;
  declare mattingByRegion: CreationOptional<NonNullable<CoatState['mattingByRegion']> | null>;
  declare undercoatLoad: CreationOptional<number>;
  declare soil: number;
  declare tableLimitMinutes: CreationOptional<number | null>;
  declare temperament: string;
  declare birthYear: CreationOptional<number | null>;
  declare cautions: string[];
  declare cautionNote: string;
  declare vetName: string;
  declare vetPhone: CreationOptional<string | null>;
  declare styleId: string;
  declare styleNotes: string;
  declare intervalWeeks: number;
  declare active: CreationOptional<boolean>;
}

Pet.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    householdId: DataTypes.STRING,
    name: DataTypes.STRING,
    species: DataTypes.STRING,
    breedId: DataTypes.STRING,
    weightGrams: DataTypes.INTEGER,
    coatType: DataTypes.STRING,
    matting: DataTypes.INTEGER,
    mattingByRegion: DataTypes.JSON,
    undercoatLoad: { type: DataTypes.INTEGER, defaultValue: 0 },
    soil: DataTypes.INTEGER,
    tableLimitMinutes: DataTypes.INTEGER,
    temperament: DataTypes.STRING,
    birthYear: DataTypes.INTEGER,
    cautions: DataTypes.JSON,
    cautionNote: DataTypes.STRING,
    vetName: DataTypes.STRING,
    vetPhone: DataTypes.STRING,
    styleId: DataTypes.STRING,
    styleNotes: DataTypes.STRING,
    intervalWeeks: DataTypes.INTEGER,
    active: { type: DataTypes.BOOLEAN, defaultValue: true },
  },
  { sequelize: database, tableName: 'pets' },
);
scopeModel(Pet);
