import type { StepFamily } from '../types.ts';

/** One pet's finished visit: what was forecast without any learning, and what the clock said. */
export interface GroomRecord {
  visitId: string;
  petId: string;
  groomerId: string;
  breedId: string | null;
  /** The group a new pet borrows from: coat and style, for example "curly, teddy". */
  coatStyle: string;
  styleId: string;
  /** Whole days since any fixed day; only differences count. */
  day: number;
  /** Whole pet, from the plain model. */
  forecast: { meanSeconds: number; varianceSeconds2: number };
  /** Work on this pet as recorded, rests included. 0 and nine hours are what forgotten timers leave. */
  actualSeconds: number;
  /** Rests the pet was given; taken off before learning. */
  restSeconds: number;
  /** Ended early for the pet's sake: never learned from. */
  ended: boolean;
  /** Two people on the shift: never learned from. */
  people: number;
  steps: GroomRecordStep[];
}

export interface GroomRecordStep {
  family: StepFamily;
  /** From the plain model. */
  medianSeconds: number;
  meanSeconds: number;
  varianceSeconds2: number;
  /** null: nobody tapped it. */
  actualSeconds: number | null;
}
