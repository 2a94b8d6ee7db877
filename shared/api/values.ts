import { z } from 'zod';

/** Field types used by more than one resource. Messages say what would be right. */
export const id = z.uuid('must be an id');
export const localDate = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}$/, 'must be a date like 2026-04-14')
  .refine((text) => {
    const date = new Date(`${text}T00:00:00Z`);
    return !Number.isNaN(date.getTime()) && date.toISOString().startsWith(text);
  }, 'must be a day that exists')
  .refine((text) => text >= '2000-01-01' && text < '2100', 'must be a date from 2000 to 2099');
export const wallMinutes = z
  .int('must be whole minutes after midnight')
  .min(0, 'must be 0:00 or later')
  .max(1440, 'must be 24:00 or earlier');
export const name = z
  .string()
  .trim()
  .min(1, 'must not be empty')
  .max(80, 'must be 80 letters or fewer');
export const note = z.string().trim().max(2000, 'must be 2,000 letters or fewer');
export const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'must be 254 letters or fewer')
  .pipe(z.email('must be an e-mail address like runa@example.org'));
/** E.164 (ITU-T): plus sign, country code, at most 15 digits. */
export const phone = z
  .string()
  .trim()
  .transform((text) => text.replace(/[\s().-]/g, ''))
  .pipe(
    z
      .string()
      .regex(/^\+[1-9]\d{6,14}$/, 'must start with + and the country code, like +14155552671'),
  );
export const latitude = z
  .number()
  .min(-85.05, 'must be a latitude')
  .max(85.05, 'must be a latitude');
export const longitude = z
  .number()
  .min(-180, 'must be a longitude')
  .max(180, 'must be a longitude');
/** bcrypt reads 72 bytes and ignores the rest, so longer passwords are refused. */
export const password = z
  .string()
  .min(10, 'must have 10 letters or more')
  .refine((text) => utf8Length(text) <= 72, 'must be 72 bytes or fewer');
/** A phone with an empty clock counts from 1970; no calendar of ours goes past 2099. */
export const instant = z.iso
  .datetime({ offset: true })
  .refine(
    (text) => Date.parse(text) >= 0 && Date.parse(text) < Date.UTC(2100, 0),
    'must be a time from 1970 to 2099',
  );
export const page = z.coerce.number().int().min(1).max(10_000).default(1);
export const done = z.object({ done: z.literal(true) });

export const role = z.enum(['operator', 'dispatcher', 'groomer']);
export type Role = z.infer<typeof role>;

function utf8Length(text: string): number {
  let bytes = 0;
  for (const letter of text) {
    const point = letter.codePointAt(0)!;
    bytes += point < 0x80 ? 1 : point < 0x800 ? 2 : point < 0x10000 ? 3 : 4;
  }
  return bytes;
}
