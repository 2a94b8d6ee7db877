import type { KnockOn, PromiseChange } from '#shared/schedule/diffDay.ts';
import type { DayProblem, DayTimes, Move } from '#shared/schedule/types.ts';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import type { WeightUnit } from '#src/lib/measures.ts';
import { writeCount, writeSpan } from '#src/lib/words.ts';
import { percentWords } from '#src/strips/stopWords.ts';
import { ruleWords } from './ruleWords.ts';
import { SAFE_PERMILLE } from './stripsOf.ts';

export interface KnockOnRow {
  key: string;
  label: string;
  value: string;
  /** `bad` and `ok` are shown as chips with a mark of their own. */
  tone: 'plain' | 'less' | 'ok' | 'bad';
}

/**
 * A knock-on in the order a person weighs it: the moved household's own promise first, then driving,
 * finishes and water, then others' promises, then rules it breaks and arrivals it shifts.
 */
export function knockOnRows(
  problem: DayProblem,
  times: DayTimes,
  knockOn: KnockOn,
  move: Move,
  unit: WeightUnit,
): KnockOnRow[] {
  const movedId = move.kind === 'placeVisit' || move.kind === 'unplaceVisit' ? move.visitId : null;
  return [
    ...(movedId === null ? [] : ownRow(problem, times, movedId)),
    drivingRow(knockOn),
    ...knockOn.runs.map((run) => ({
      key: `finish-${run.vanId}`,
      label: `${run.vanName} finishes`,
      value:
        run.finishBeforeSeconds === run.finishAfterSeconds
          ? `${formatWall(problem, run.finishAfterSeconds)} as before`
          : `${formatWall(problem, run.finishBeforeSeconds)} → ${formatWall(problem, run.finishAfterSeconds)}`,
      tone: 'plain' as const,
    })),
    ...overtimeRow(knockOn),
    ...refillRows(problem, knockOn),
    ...knockOn.promises
      .filter((promise) => promise.visitId !== movedId)
      .flatMap((promise) => promiseRow(problem, promise)),
    ...knockOn.newlyBroken
      .filter((broken) => broken.rule !== 'promise')
      .map((broken) => ({
        key: `rule-${broken.rule}-${broken.vanId}-${broken.stopId}`,
        label: ruleWords(problem, broken, unit),
        value: broken.hard ? 'breaks a rule' : 'not ideal',
        tone: 'bad' as const,
      })),
    ...othersRow(knockOn, movedId),
  ];
}

function ownRow(problem: DayProblem, times: DayTimes, visitId: string): KnockOnRow[] {
  const fact = problem.visits.find((visit) => visit.id === visitId);
  if (!fact) return [];
  const stop = times.runs.flatMap((run) => run.stops).find((one) => one.stopId === visitId);
  const promised = fact.promise
    ? `promised ${formatWallRange(problem, fact.promise.startSeconds, fact.promise.endSeconds)}`
    : 'nothing promised yet';
  const row = { key: 'own', label: `${fact.label}, ${promised}` };
  if (!stop)
    return [
      fact.promise
        ? { ...row, value: 'on no van', tone: 'bad' }
        : { ...row, value: 'on no van', tone: 'plain' },
    ];
  if (stop.onTimePermille === null)
    return [{ ...row, value: `arrives ${formatWall(problem, stop.arriveSeconds)}`, tone: 'plain' }];
  return [
    {
      ...row,
      value: `${percentWords(stop.onTimePermille)} on time`,
      tone: stop.onTimePermille >= SAFE_PERMILLE ? 'ok' : 'bad',
    },
  ];
}

function drivingRow(knockOn: KnockOn): KnockOnRow {
  const row = { key: 'driving', label: 'Driving' };
  if (Math.abs(knockOn.driveSeconds) < 30) return { ...row, value: 'the same', tone: 'plain' };
  const less = knockOn.driveSeconds < 0;
  return {
    ...row,
    value: `${writeSpan(Math.abs(knockOn.driveSeconds))} ${less ? 'less' : 'more'}`,
    tone: less ? 'less' : 'plain',
  };
}

function overtimeRow(knockOn: KnockOn): KnockOnRow[] {
  if (Math.abs(knockOn.overtimeSeconds) < 60) return [];
  const more = knockOn.overtimeSeconds > 0;
  return [
    {
      key: 'overtime',
      label: 'Past the end of the shift',
      value: `${writeSpan(Math.abs(knockOn.overtimeSeconds))} ${more ? 'more' : 'less'}`,
      tone: more ? 'bad' : 'ok',
    },
  ];
}

function refillRows(problem: DayProblem, knockOn: KnockOn): KnockOnRow[] {
  const minutes = (placeId: string) =>
    writeSpan(problem.refills.find((place) => place.id === placeId)?.lengthSeconds ?? 0);
  return [
    ...knockOn.refillsAdded.map((refill) => ({
      key: `refill-${refill.vanId}-${refill.placeId}`,
      label: `${refill.vanName}’s water`,
      value: `refill added at ${refill.placeName}, ${minutes(refill.placeId)}`,
      tone: 'plain' as const,
    })),
    ...knockOn.refillsRemoved.map((refill) => ({
      key: `no-refill-${refill.vanId}-${refill.placeId}`,
      label: `${refill.vanName}’s water`,
      value: `no refill at ${refill.placeName}`,
      tone: 'less' as const,
    })),
  ];
}

/** Others' promises only where it matters: at risk before or after, or placed and unplaced. */
function promiseRow(problem: DayProblem, change: PromiseChange): KnockOnRow[] {
  const window = problem.visits.find((visit) => visit.id === change.visitId)?.promise;
  const after = change.afterPermille;
  if (!window || after === null) return [];
  const wasSafe = (change.beforePermille ?? 0) >= SAFE_PERMILLE;
  const isSafe = after >= SAFE_PERMILLE;
  if (wasSafe && isSafe) return [];
  return [
    {
      key: `promise-${change.visitId}`,
      label: `${change.label}, promised ${formatWallRange(problem, window.startSeconds, window.endSeconds)}`,
      value: `${percentWords(after)} on time`,
      tone: isSafe ? 'ok' : 'bad',
    },
  ];
}

function othersRow(knockOn: KnockOn, movedId: string | null): KnockOnRow[] {
  const shifts = knockOn.arrivals.flatMap((arrival) =>
    arrival.visitId === movedId ||
    arrival.arriveBeforeSeconds === null ||
    arrival.arriveAfterSeconds === null
      ? []
      : [arrival.arriveAfterSeconds - arrival.arriveBeforeSeconds],
  );
  const side = (list: number[], word: string) => {
    if (list.length === 0) return [];
    const sizes = list.map((seconds) => Math.abs(seconds));
    const [least, most] = [writeSpan(Math.min(...sizes)), writeSpan(Math.max(...sizes))];
    return [
      {
        key: `others-${word}`,
        label: writeCount(list.length, 'other arrival'),
        value: `${least === most ? most : `${most.endsWith('min') ? least.replace(/ min$/, '') : least}–${most}`} ${word}`,
        tone: 'plain' as const,
      },
    ];
  };
  return [
    ...side(
      shifts.filter((seconds) => seconds >= 60),
      'later',
    ),
    ...side(
      shifts.filter((seconds) => seconds <= -60),
      'earlier',
    ),
  ];
}
