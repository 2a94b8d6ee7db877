import type { Shift } from '#shared/api/groomers.ts';

/** Common practice: half an hour around noon, once the day is longer than six hours. */
export const mealStart: NonNullable<Shift['meal']> = {
  lengthMinutes: 30,
  earliestMinutes: 11 * 60 + 30,
  latestMinutes: 14 * 60,
  dueAfterMinutes: 6 * 60,
};

/**
 * What a shift's form begins with: itself, else the van's other shift of the week, else a plain day
 * of the only groomer there is.
 */
export function shiftStart(
  shift: Shift | null,
  week: readonly Shift[],
  vanId: string,
  groomerIds: readonly string[],
) {
  const like = shift ?? week.find((one) => one.vanId === vanId);
  return {
    groomerId: like?.groomerId ?? (groomerIds.length === 1 ? groomerIds[0]! : ''),
    startMinutes: like?.startMinutes ?? 8 * 60,
    endMinutes: like?.endMinutes ?? 17 * 60,
    mostOvertimeMinutes: like?.mostOvertimeMinutes ?? 30,
  };
}
