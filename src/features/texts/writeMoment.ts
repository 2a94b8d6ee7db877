/** An instant in a business's zone: '9:48' for `today`, else 'Tue 14 Apr, 9:48'. */
export function writeMoment(instant: string, timeZone: string, today: string): string {
  const at = new Date(instant);
  const time = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hour: 'numeric',
    minute: '2-digit',
  }).format(at);
  // Canadian English writes dates as YYYY-MM-DD.
  const date = new Intl.DateTimeFormat('en-CA', { timeZone }).format(at);
  if (date === today) return time;
  const day = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'short',
    day: 'numeric',
    month: 'short',
  })
    .format(at)
    .replace(',', '');
  return `${day}, ${time}`;
}
