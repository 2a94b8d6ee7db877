import { UniqueConstraintError } from 'sequelize';
import { Day } from '#server/models/Day.ts';

/** The row of a date, made when missing and locked until the transaction ends. Writers take it first. */
export async function lockDay(date: string): Promise<Day> {
  const found = await Day.findOne({ where: { date }, lock: true });
  if (found) return found;
  try {
    return await Day.create({ date });
  } catch (error) {
    // Someone else made it between the look and the write.
    if (!(error instanceof UniqueConstraintError)) throw error;
    return (await Day.findOne({ where: { date }, lock: true }))!;
  }
}
