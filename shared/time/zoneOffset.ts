const formats = new Map<string, Intl.DateTimeFormat>();

/** A wall clock's reading. `month` is 1–12. */
export interface WallReading {
  year: number;
  month: number;
  day: number;
  hour: number;
  minute: number;
  second: number;
}

/** What a wall clock in `timeZone` reads at `instantMs` (epoch milliseconds). */
export function readWall(timeZone: string, instantMs: number): WallReading {
  const reading: WallReading = { year: 0, month: 0, day: 0, hour: 0, minute: 0, second: 0 };
  for (const { type, value } of formatOf(timeZone).formatToParts(instantMs))
    if (type in reading) reading[type as keyof WallReading] = Number(value);
  return reading;
}

/** Milliseconds the zone's wall clock is ahead of UTC at `instantMs`. */
export function zoneOffsetMs(timeZone: string, instantMs: number): number {
  const wall = readWall(timeZone, instantMs);
  const asUtc = Date.UTC(wall.year, wall.month - 1, wall.day, wall.hour, wall.minute, wall.second);
  return asUtc - Math.floor(instantMs / 1000) * 1000;
}

/**
 * The instant (epoch ms) at which the zone's wall clock reads what UTC reads at `wallMs`.
 * A reading that happens twice means the first time; one that is skipped moves on by the gap.
 */
export function wallToInstantMs(timeZone: string, wallMs: number): number {
  const dayMs = 86_400_000;
  const before = zoneOffsetMs(timeZone, wallMs - dayMs);
  const after = zoneOffsetMs(timeZone, wallMs + dayMs);
  const found = [wallMs - before, wallMs - after]
    .filter((instant) => instant + zoneOffsetMs(timeZone, instant) === wallMs)
    .sort((a, b) => a - b);
  return found[0] ?? wallMs - before;
}

function formatOf(timeZone: string): Intl.DateTimeFormat {
  const known = formats.get(timeZone);
  if (known) return known;
  let made: Intl.DateTimeFormat;
  try {
    made = new Intl.DateTimeFormat('en-US', {
      timeZone,
      calendar: 'gregory',
      numberingSystem: 'latn',
      hourCycle: 'h23',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
      hour: 'numeric',
      minute: 'numeric',
      second: 'numeric',
    });
  } catch {
    throw new RangeError(
      `timeZone: '${timeZone}' is not an IANA time zone; try a name like 'Europe/Vaduz'`,
    );
  }
  formats.set(timeZone, made);
  return made;
}
