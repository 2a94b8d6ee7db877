import { Op } from 'sequelize';
import { AppError, badField, notFound } from '#server/errors.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Run } from '#server/models/Run.ts';
import { Shift } from '#server/models/Shift.ts';
import { Van } from '#server/models/Van.ts';
import { lockDay } from '#server/services/days/lockDay.ts';

type ShiftInput = Pick<
  Shift,
  'date' | 'vanId' | 'groomerId' | 'startMinutes' | 'endMinutes' | 'mostOvertimeMinutes'
> & { meal: Shift['meal'] };

const longestSpanDays = 62;

export async function listShifts(from: string, to: string): Promise<Shift[]> {
  if (to < from) throw badField('to', 'must not be before from');
  if ((Date.parse(to) - Date.parse(from)) / 86_400_000 > longestSpanDays)
    throw badField('to', `must be at most ${longestSpanDays} days after from`);
  return Shift.findAll({
    where: { date: { [Op.between]: [from, to] } },
    order: [
      ['date', 'ASC'],
      ['startMinutes', 'ASC'],
    ],
  });
}

/** Sets the shift of a van on a date and keeps its run in step; a sent run's groomer stays. */
export async function setShift(input: ShiftInput): Promise<Shift> {
  if (input.meal && input.meal.latestMinutes < input.meal.earliestMinutes)
    throw badField('meal.latestMinutes', 'must not be before the earliest start');
  if (!(await Van.findOne({ where: { id: input.vanId, active: true } })))
    throw badField('vanId', 'must be a van in use');
  if (!(await Groomer.findOne({ where: { id: input.groomerId, active: true } })))
    throw badField('groomerId', 'must be a groomer of this business');
  await lockDay(input.date);
  const elsewhere = await Shift.findOne({
    where: { date: input.date, groomerId: input.groomerId, vanId: { [Op.ne]: input.vanId } },
  });
  if (elsewhere) throw badField('groomerId', 'already has a shift in another van that day');
  const present = await Shift.findOne({
    where: { date: input.date, vanId: input.vanId },
    lock: true,
  });
  const shift = present ? await present.update(input) : await Shift.create(input);
  const run = await Run.findOne({ where: { date: input.date, vanId: input.vanId }, lock: true });
  if (run?.sentAt && run.groomerId !== input.groomerId)
    throw new AppError(
      'alreadyThere',
      'This run was already sent to its groomer. Move its visits instead.',
      {
        fields: { groomerId: 'the run was already sent' },
      },
    );
  if (run) await run.update({ groomerId: input.groomerId, version: run.version + 1 });
  else
    await Run.create({
      date: input.date,
      vanId: input.vanId,
      groomerId: input.groomerId,
      stops: [],
    });
  return shift;
}

/** Its visits become not placed; refused once the run was sent. */
export async function removeShift(shiftId: string): Promise<void> {
  const found = await Shift.findByPk(shiftId);
  if (!found) throw notFound('shift');
  const day = await lockDay(found.date);
  // Looked up again under the lock: a second click must not take the run of a shift set since.
  const shift = await Shift.findByPk(shiftId, { lock: true });
  if (!shift) throw notFound('shift');
  const run = await Run.findOne({ where: { date: shift.date, vanId: shift.vanId }, lock: true });
  if (run?.sentAt)
    throw new AppError('alreadyThere', 'This run was already sent. Move its visits instead.');
  await run?.destroy();
  await shift.destroy();
  await day.update({ version: day.version + 1 });
}
