import { Op } from 'sequelize';
import { inverseMove } from '#shared/schedule/inverseMove.ts';
import type { Move, Plan } from '#shared/schedule/types.ts';
import { AppError } from '#server/errors.ts';
import type { Day } from '#server/models/Day.ts';
import { DayChange } from '#server/models/DayChange.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { type LoadedDay, loadDay } from './loadDay.ts';
import { lockDay } from './lockDay.ts';
import { logChange } from './logChange.ts';
import { type Conflict, makeMove } from './moveVisit.ts';
import { savePlan } from './savePlan.ts';

/** What undo and redo would do next. */
export interface UndoState {
  undo: DayChange | null;
  redo: DayChange | null;
}

/** The last move that counts, and the first of those taken back since the last move was made. */
export async function undoState(day: Day): Promise<UndoState> {
  const where = { dayId: day.id, move: { [Op.ne]: null } };
  const undo = await DayChange.findOne({
    where: { ...where, undoneAt: null },
    order: [['seq', 'DESC']],
  });
  const lastMove = await DayChange.findOne({
    where,
    attributes: ['id', 'businessId', 'seq'],
    order: [['seq', 'DESC']],
  });
  const undos = await DayChange.findAll({
    where: { dayId: day.id, kind: 'undo', seq: { [Op.gt]: lastMove?.seq ?? 0 } },
    attributes: ['id', 'businessId', 'undoes'],
  });
  const redo = await DayChange.findOne({
    where: { id: undos.flatMap((one) => one.undoes ?? []), undoneAt: { [Op.ne]: null } },
    order: [['seq', 'ASC']],
  });
  return { undo, redo };
}

/** A cancelled visit's moves can neither be taken back nor made again: undo passes over them. */
export async function forgetMoves(day: Day, visitId: string, now: Date): Promise<void> {
  const changes = await DayChange.findAll({
    where: { dayId: day.id, move: { [Op.ne]: null }, undoneAt: null },
    attributes: ['id', 'businessId', 'move'],
  });
  for (const change of changes)
    if ('visitId' in change.move! && change.move.visitId === visitId)
      await change.update({ undoneAt: now });
}

/**
 * Undo is the inverse move on the day as it is now, or a reason why not. With `changeId`, a conflict
 * when another change came after the one the screen offered: nobody takes back what they have not seen.
 */
export async function undoMove(
  actor: Actor,
  date: string,
  changeId: string | undefined,
  now: Date,
): Promise<LoadedDay | Conflict> {
  const day = await lockDay(date);
  const { undo } = await undoState(day);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  if (changeId && undo?.id !== changeId) return { conflict: true, day: loaded };
  if (!undo) throw new AppError('refusedMove', 'There is nothing to undo on this day.');
  const next = makeMoveAgain(loaded, undo, inverseMove(undo.before!, undo.after!, undo.move!));
  await undo.update({ undoneAt: now });
  await logChange(day, {
    actor,
    now,
    kind: 'undo',
    words: `Undone: ${undo.words}`,
    undoes: undo.id,
  });
  return savePlan(loaded, next);
}

/** Makes the move again that was taken back last; `changeId` as for undo. */
export async function redoMove(
  actor: Actor,
  date: string,
  changeId: string | undefined,
  now: Date,
): Promise<LoadedDay | Conflict> {
  const day = await lockDay(date);
  const { redo } = await undoState(day);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  if (changeId && redo?.id !== changeId) return { conflict: true, day: loaded };
  if (!redo) throw new AppError('refusedMove', 'There is nothing to redo on this day.');
  const next = makeMoveAgain(loaded, redo, redo.move!);
  await redo.update({ undoneAt: null });
  await logChange(day, { actor, now, kind: 'redo', words: `Redone: ${redo.words}` });
  return savePlan(loaded, next);
}

/** An old move may name what has left the day since: a reason why not, no missing page. */
function makeMoveAgain(loaded: LoadedDay, change: DayChange, move: Move): Plan {
  try {
    return makeMove(loaded, move);
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== 'notFound') throw error;
    throw new AppError(
      'refusedMove',
      `“${change.words}” stays: a visit or van of it is no longer on this day.`,
    );
  }
}
