import { Op } from 'sequelize';
import { inverseMove } from '#shared/schedule/inverseMove.ts';
import { AppError } from '#server/errors.ts';
import type { Day } from '#server/models/Day.ts';
import { DayChange } from '#server/models/DayChange.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { type LoadedDay, loadDay } from './loadDay.ts';
import { lockDay } from './lockDay.ts';
import { logChange } from './logChange.ts';
import { makeMove } from './moveVisit.ts';
import { savePlan } from './savePlan.ts';

/** What undo and redo would do next. */
export interface UndoState {
  undo: DayChange | null;
  redo: DayChange | null;
}

/** The last move that counts, and the first taken-back one after it. */
export async function undoState(day: Day | null): Promise<UndoState> {
  if (!day) return { undo: null, redo: null };
  const where = { dayId: day.id, move: { [Op.ne]: null } };
  const undo = await DayChange.findOne({
    where: { ...where, undoneAt: null },
    order: [['seq', 'DESC']],
  });
  const redo = await DayChange.findOne({
    where: { ...where, undoneAt: { [Op.ne]: null }, seq: { [Op.gt]: undo?.seq ?? 0 } },
    order: [['seq', 'ASC']],
  });
  return { undo, redo };
}

/** Undo is the inverse move on the day as it is now, or a reason why not. */
export async function undoMove(actor: Actor, date: string, now: Date): Promise<LoadedDay> {
  const day = await lockDay(date);
  const { undo } = await undoState(day);
  if (!undo) throw new AppError('refusedMove', 'There is nothing to undo on this day.');
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  const next = makeMove(loaded, inverseMove(undo.before!, undo.after!, undo.move!));
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

/** Makes the move again that was taken back last. */
export async function redoMove(actor: Actor, date: string, now: Date): Promise<LoadedDay> {
  const day = await lockDay(date);
  const { redo } = await undoState(day);
  if (!redo) throw new AppError('refusedMove', 'There is nothing to redo on this day.');
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  const next = makeMove(loaded, redo.move!);
  await redo.update({ undoneAt: null });
  await logChange(day, { actor, now, kind: 'redo', words: `Redone: ${redo.words}` });
  return savePlan(loaded, next);
}
