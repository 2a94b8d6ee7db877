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
import type { Spread, TankUse } from '#shared/schedule/types.ts';

export type VisitStatus = 'booked' | 'cancelled' | 'done' | 'failed';
export interface AllowedWall {
  startMinutes: number;
  endMinutes: number;
  binds: 'arrival' | 'stay';
}
export interface VisitPinRow {
  vanId?: string;
}
/** A pet's forecast step as booked: booking stores the forecast, later models do not change it. */
export interface ForecastStep {
  petId: string;
  key: string;
  family: 'prep' | 'wash' | 'dry' | 'clip' | 'scissor' | 'wrap';
  label: string;
  medianSeconds: number;
  meanSeconds: number;
  varianceSeconds2: number;
  attentionPermille: number;
  reasons: { text: string; deltaSeconds: number }[];
}
export interface VisitForecast {
  steps: ForecastStep[];
  work: Spread;
  p10Seconds: number;
  p90Seconds: number;
  setUpSeconds: number;
  cleanDownSeconds: number;
  tankUse: TankUse[];
  needs: string[];
  heaviestGrams: number;
  /** Of the first pet, for leans: "curly · scissored teddy". */
  coatStyle: string;
  /** Work where a groomer's pace was known at booking, by groomer id. Absent before learning. */
  workByGroomer?: Record<string, Spread>;
  /** The household's door as booked. Absent on visits booked before it was learned. */
  door?: {
    /** Set-up and clean-down against the usual, 1000 = usual, and from how many visits. */
    permille: number;
    visits: number;
    /** Both as usual; null when disinfectant's contact time is in them, which is no door's doing. */
    usualSeconds: number | null;
  };
  /** What learning needs later and what it said now. Absent on visits booked before it. */
  learning?: VisitLearning;
}
export interface VisitLearning {
  /** The fit used; null: the plain model. */
  fitId: string | null;
  /** Per pet: the plain model's word, which is what the clock is compared with. */
  plain: {
    petId: string;
    breedId: string | null;
    styleId: string;
    coatStyle: string;
    meanSeconds: number;
    varianceSeconds2: number;
    steps: Pick<
      ForecastStep,
      'key' | 'family' | 'medianSeconds' | 'meanSeconds' | 'varianceSeconds2'
    >[];
  }[];
  /** What the learning says of these pets, ready to show. */
  words: string[];
  petVisits: number;
  learnedPermille: number;
}

export class Visit extends Model<InferAttributes<Visit>, InferCreationAttributes<Visit>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare householdId: string;
  declare date: string;
  declare status: VisitStatus;
  declare allowed: AllowedWall[];
  declare preferredGroomerId: CreationOptional<string | null>;
  declare pin: CreationOptional<VisitPinRow | null>;
  declare note: string;
  declare forecast: VisitForecast;
  declare modelVersion: string;
  declare cancelReason: CreationOptional<string | null>;
  declare createdAt: Date;
}

Visit.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    householdId: DataTypes.STRING,
    date: DataTypes.DATEONLY,
    status: DataTypes.STRING,
    allowed: DataTypes.JSON,
    preferredGroomerId: DataTypes.STRING,
    pin: DataTypes.JSON,
    note: DataTypes.STRING,
    forecast: DataTypes.JSON,
    modelVersion: DataTypes.STRING,
    cancelReason: DataTypes.STRING,
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'visits' },
);
scopeModel(Visit);
