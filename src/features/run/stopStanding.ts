import { writeSpan } from '#src/lib/words.ts';
import type { RunStop } from './runView.ts';

export interface Standing {
  words: string;
  tone: 'ok' | 'bad' | 'plain';
}

/** A promise counts as safe from 9 in 10 on, as on the desk's board. */
const safePermille = 900;

/** How a stop's promise stands: "promise safe", "64 % on time", "12 min late"; null without one. */
export function stopStanding(stop: RunStop): Standing | null {
  if (!stop.promise || stop.state === 'failed') return null;
  const lateSeconds = stop.times.arriveSeconds - stop.promise.endSeconds;
  if (stop.state !== 'ahead' && stop.state !== 'driving')
    return lateSeconds > 0
      ? { words: `came ${lateWords(lateSeconds)} late`, tone: 'bad' }
      : { words: 'promise kept', tone: 'ok' };
  const chance = stop.times.onTimePermille;
  if (chance === null) return null;
  if (chance >= safePermille) return { words: 'promise safe', tone: 'ok' };
  if (chance < 100 && lateSeconds > 0)
    return { words: `about ${lateWords(lateSeconds)} late`, tone: 'bad' };
  return { words: `${Math.max(1, Math.round(chance / 10))} % on time`, tone: 'bad' };
}

function lateWords(seconds: number): string {
  return writeSpan(Math.max(60, seconds));
}
