/** SDs of log seconds × 1000, chances in permille, of the world `simulateVisit` draws from. */
export interface SimulationSettings {
  groomerPermille: number;
  groomerFamilyPermille: number;
  petPermille: number;
  petFamilyPermille: number;
  coatStylePermille: number;
  householdPermille: number;
  /** One draw per pet and day, shared by its steps. */
  dayPermille: number;
  stepPermille: number;
  doorPermille: number;
  /** Some steps go badly wrong or oddly well: their noise is drawn this much wider. */
  wildChancePermille: number;
  wildTimesPermille: number;
  /** A timer never started (recorded as 0) or never stopped (recorded as hours). */
  forgottenTimerPermille: number;
}

/**
 * The demo's past. Chosen, not fitted, and the forecast is not tuned to what it draws; on purpose not
 * the forecast's own world either: heavy tails, drift, forgotten timers, households with slow doors.
 */
export const simulationSettings: SimulationSettings = {
  groomerPermille: 100,
  groomerFamilyPermille: 60,
  petPermille: 150,
  petFamilyPermille: 60,
  coatStylePermille: 70,
  householdPermille: 200,
  dayPermille: 100,
  stepPermille: 180,
  doorPermille: 250,
  wildChancePermille: 40,
  wildTimesPermille: 2500,
  forgottenTimerPermille: 10,
};
