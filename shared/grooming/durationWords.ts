/** Whole minutes, hours from one on: "44 min", "2 h 14", "2 h". */
export function durationWords(seconds: number): string {
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  const rest = minutes % 60;
  return rest === 0 ? `${minutes / 60} h` : `${Math.floor(minutes / 60)} h ${pad(rest)}`;
}

function pad(minutes: number): string {
  return String(minutes).padStart(2, '0');
}
