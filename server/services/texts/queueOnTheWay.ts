import { Op } from 'sequelize';
import { notFound } from '#server/errors.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import type { OutboxText } from '#server/models/OutboxText.ts';
import { Pet } from '#server/models/Pet.ts';
import { Promise as VisitPromise } from '#server/models/Promise.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { hashToken, makeToken } from '#server/services/secrets/tokens.ts';
import type { WallRange } from '#shared/texts/wallRange.ts';
import { queueText } from './queueText.ts';

/** How long after the arrival the page still answers: report and thanks are read in the evening. */
const linkHours = 24;

/**
 * Queues the text a household gets when the van starts driving to it, with a link to its arrival
 * page, in the caller's scope and transaction. `arrival` is the forecast range as wall times of the
 * business, `until` its late end: after that the text is stale. Told once per promise; asking again
 * answers the row there is. Throws 'notFound' for another business's visit.
 */
export async function queueOnTheWay(asked: {
  visitId: string;
  runId: string;
  groomerName: string;
  arrival: WallRange;
  until: Date;
  /** Where pages live, without a slash at the end. */
  origin: string;
  now: Date;
}): Promise<OutboxText> {
  const { visitId, runId, groomerName, arrival, until, origin, now } = asked;
  const visit = await Visit.findByPk(visitId);
  if (!visit) throw notFound('visit');
  const promise = await VisitPromise.findOne({ where: { visitId }, order: [['version', 'DESC']] });
  const token = makeToken();
  const text = await queueText({
    householdId: visit.householdId,
    visitId,
    kind: 'onTheWay',
    promiseVersion: promise?.version ?? 0,
    fields: {
      groomerName,
      petNames: await petNamesOf(visitId),
      arrival,
      link: `${origin}/a/${token}`,
    },
    now,
    until,
  });
  // No link for a text that stays, or that an earlier call wrote with a link of its own.
  if (text.status === 'waiting' && text.body.includes(token))
    await ArrivalLink.create({
      visitId,
      runId,
      tokenHash: hashToken(token),
      expiresAt: new Date(until.getTime() + linkHours * 3_600_000),
      createdAt: now,
    });
  return text;
}

async function petNamesOf(visitId: string): Promise<string[]> {
  const rows = await VisitPet.findAll({ where: { visitId }, order: ['position'] });
  const pets = await Pet.findAll({ where: { id: { [Op.in]: rows.map((row) => row.petId) } } });
  return rows.flatMap(({ petId }) => pets.find((pet) => pet.id === petId)?.name ?? []);
}
