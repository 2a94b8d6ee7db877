/** "2 h 14", "48 min", "0 min": the design's way of writing a length, cut from whole minutes. */
export function writeSpan(seconds: number): string {
  const minutes = Math.round(seconds / 60);
  const sign = minutes < 0 ? '−' : '';
  const hours = Math.floor(Math.abs(minutes) / 60);
  const rest = Math.abs(minutes) % 60;
  return hours === 0 ? `${sign}${rest} min` : `${sign}${hours} h ${String(rest).padStart(2, '0')}`;
}

/** "+9", "−3": whole minutes with their sign. */
export function writeDelta(seconds: number): string {
  const minutes = Math.round(seconds / 60);
  return minutes < 0 ? `−${-minutes}` : `+${minutes}`;
}

/** "Tuesday 14 April" of a local date; the year too when it is not `thisYear`. */
export function writeDate(
  date: string,
  style: 'long' | 'short' = 'long',
  thisYear?: number,
): string {
  const day = new Date(`${date}T00:00:00Z`);
  const other = thisYear !== undefined && day.getUTCFullYear() !== thisYear;
  return new Intl.DateTimeFormat('en-GB', {
    weekday: style,
    day: 'numeric',
    month: style,
    ...(other ? { year: 'numeric' } : {}),
    timeZone: 'UTC',
  })
    .format(day)
    .replace(',', '');
}

/** "Moss", "Moss and Clover", "Moss, Clover and Fern". */
export function writeList(names: readonly string[]): string {
  if (names.length < 2) return names.join('');
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

/** "1 pet", "2 pets". */
export function writeCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
