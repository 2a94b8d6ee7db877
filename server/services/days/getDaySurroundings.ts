import { Day } from '#server/models/Day.ts';
import { DayChange } from '#server/models/DayChange.ts';
import { Proposal } from '#server/models/Proposal.ts';
import type { LoadedDay } from './loadDay.ts';
import { type UndoState, undoState } from './undoMove.ts';

/** What the board shows beside the day itself. */
export interface DaySurroundings extends UndoState {
  log: DayChange[];
  openProposal: Proposal | null;
}

const shownChanges = 40;

export async function getDaySurroundings(
  loaded: Pick<LoadedDay, 'date'>,
): Promise<DaySurroundings> {
  const day = await Day.findOne({ where: { date: loaded.date } });
  if (!day) return { undo: null, redo: null, log: [], openProposal: null };
  const [state, log, openProposal] = await Promise.all([
    undoState(day),
    DayChange.findAll({
      where: { dayId: day.id },
      attributes: ['id', 'businessId', 'at', 'who', 'words', 'seq'],
      order: [['seq', 'DESC']],
      limit: shownChanges,
    }),
    Proposal.findOne({
      where: { dayId: day.id, state: ['working', 'ready'] },
      attributes: ['id', 'businessId', 'state'],
      order: [['createdAt', 'DESC']],
    }),
  ]);
  return { ...state, log, openProposal };
}
