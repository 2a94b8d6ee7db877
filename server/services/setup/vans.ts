import { Op } from 'sequelize';
import { AppError, badField, notFound } from '#server/errors.ts';
import { Place } from '#server/models/Place.ts';
import { Run } from '#server/models/Run.ts';
import { Shift } from '#server/models/Shift.ts';
import { Van } from '#server/models/Van.ts';

type VanInput = Pick<
  Van,
  'name' | 'shape' | 'startPlaceId' | 'endPlaceId' | 'tanks' | 'tableLimitGrams'
>;

/** Vans in use, in name order; retired ones stay in the past's runs. */
export function listVans(): Promise<Van[]> {
  return Van.findAll({ where: { active: true }, order: [['name', 'ASC']] });
}

export async function createVan(input: VanInput): Promise<Van> {
  await needPlaces(input);
  await needFreeName(input.name, null);
  return Van.create(input);
}

export async function updateVan(vanId: string, change: Partial<VanInput>): Promise<Van> {
  const van = await needVan(vanId);
  await needPlaces(change);
  if (change.name !== undefined) await needFreeName(change.name, vanId);
  return van.update(change);
}

/**
 * Refused while runs with visits lie ahead: their households hold promises. Its empty shifts go with
 * it; a run already sent stays as its groomer has it.
 */
export async function retireVan(vanId: string, today: string): Promise<void> {
  const van = await needVan(vanId);
  const runs = await Run.findAll({ where: { vanId, date: { [Op.gte]: today } } });
  const busy = runs.filter((run) => run.stops.some((stop) => stop.kind === 'visit'));
  if (busy.length > 0)
    throw new AppError(
      'alreadyThere',
      `${van.name} still has visits on ${busy[0]!.date}. Move them first.`,
    );
  const sent = runs.filter((run) => run.sentAt).map((run) => run.date);
  const ahead = { vanId, date: { [Op.gte]: today, [Op.notIn]: sent } };
  await Run.destroy({ where: ahead });
  await Shift.destroy({ where: ahead });
  await van.update({ active: false });
}

async function needVan(vanId: string): Promise<Van> {
  const van = await Van.findByPk(vanId);
  if (!van) throw notFound('van');
  return van;
}

async function needPlaces(input: Partial<VanInput>): Promise<void> {
  for (const field of ['startPlaceId', 'endPlaceId'] as const) {
    const id = input[field];
    if (id !== undefined && !(await Place.findByPk(id)))
      throw badField(field, 'must be a place of this business');
  }
}

async function needFreeName(name: string, exceptId: string | null): Promise<void> {
  const other = await Van.findOne({ where: { name, active: true } });
  if (other && other.id !== exceptId)
    throw new AppError('alreadyThere', `There is already a van named ${name}.`, {
      fields: { name: 'is already taken' },
    });
}
