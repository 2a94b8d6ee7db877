import { DateTime } from 'luxon';
import { Business } from '#server/models/Business.ts';

/** The business's local date right now. */
export async function today(businessId: string, now: Date): Promise<string> {
  const business = await Business.findByPk(businessId);
  return localDateOf(now, business!.timeZone);
}

export function localDateOf(instant: Date, timeZone: string): string {
  return DateTime.fromJSDate(instant, { zone: timeZone }).toISODate()!;
}
