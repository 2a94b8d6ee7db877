import { app, useApp } from '../support/useApp.ts';
import { expect, it } from 'vitest';
import { createVisit } from '#shared/api/visits.ts';
import { doorPermille } from '#shared/grooming/learning/doorPermille.ts';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { Visit } from '#server/models/Visit.ts';
import { workDay } from '../support/workDay.ts';

useApp();

it('a household with a slow door is booked with more minutes around the pet, others are not', async () => {
  const day = await workDay(app, [{ petName: 'Rook' }, { petName: 'Wren' }, { petName: 'Sorrel' }]);
  const { client, phone, stopOf, visits, date } = day;
  await day.at('15:00');
  const petOf = (name: string) => visits[name]!.pet.id;
  const tapped = (name: string, hour: number, onTable: string, done: string, left: string) => [
    phone('startDriving', stopOf(name), `${hour - 1}:50`),
    phone('arrived', stopOf(name), `${hour}:00`),
    phone('petOnTable', stopOf(name), `${hour}:${onTable}`, { petId: petOf(name) }),
    phone('petDone', stopOf(name), `${hour}:${done}`, { petId: petOf(name) }),
    phone('stopDone', stopOf(name), `${hour}:${left}`, { note: '' }),
  ];
  const answer = await day.post([
    // Booked with six minutes before and six after. Rook's gate took twelve and twelve.
    ...tapped('Rook', 9, '12', '40', '52'),
    // A pet put on the table at once and never taken off: nothing to learn from.
    phone('startDriving', stopOf('Wren'), '9:55'),
    phone('arrived', stopOf('Wren'), '10:00'),
    phone('stopDone', stopOf('Wren'), '10:50', { note: '' }),
    // Sorrel's stop was closed an hour late.
    ...tapped('Sorrel', 11, '06', '40', '41').slice(0, -1),
    phone('stopDone', stopOf('Sorrel'), '12:50', { note: '' }),
  ]);
  expect(answer.status).toBe(200);
  const book = async (name: string) => {
    const { id } = await client.must(createVisit, {
      body: {
        householdId: visits[name]!.household.id,
        date: addDays(date, 1),
        petIds: [petOf(name)],
      },
    });
    return inBusiness(day.businessId, async () => (await Visit.findByPk(id))!.forecast);
  };
  const slow = await book('Rook');
  const { permille } = doorPermille([{ usualSeconds: 720, actualSeconds: 1440 }]);
  expect(permille).toBeGreaterThan(1200);
  expect(slow.door).toEqual({ permille, visits: 1, usualSeconds: 720 });
  const atDoor = Math.round((360 * permille) / 1000);
  expect([slow.setUpSeconds, slow.cleanDownSeconds]).toEqual([atDoor, atDoor]);
  for (const name of ['Wren', 'Sorrel']) {
    const usual = await book(name);
    expect(usual.door).toEqual({ permille: 1000, visits: 0, usualSeconds: 720 });
    expect([usual.setUpSeconds, usual.cleanDownSeconds]).toEqual([360, 360]);
  }
});
