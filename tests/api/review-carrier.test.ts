import { app, useApp } from '../support/useApp.ts';
import { afterEach, expect, it } from 'vitest';
import { signUp } from '#shared/api/session.ts';
import { inBusiness } from '#server/db/database.ts';
import { queueText } from '#server/services/texts/queueText.ts';
import { setTextRules } from '#server/services/texts/textRules.ts';
import { ApiClient, newBusiness } from '../support/apiClient.ts';
import { addHousehold } from '../support/buildBusiness.ts';

useApp({ carriers: true });
afterEach(() => setTextRules(null));

it('with a real carrier a second business does not sign up by itself', async () => {
  const rules = { prefixes: ['+44'], perDay: 500, signUpsOpen: false };
  const status = async () =>
    (await new ApiClient(app).call(signUp, { body: newBusiness() })).status;
  setTextRules(rules);
  // The first one is the person who runs the server.
  expect([await status(), await status()]).toEqual([200, 403]);
  setTextRules({ ...rules, signUpsOpen: true });
  expect(await status()).toBe(200);
  setTextRules(null);
  expect(await status()).toBe(200);
});

it('texts go to allowed countries, and so many a day', async () => {
  const client = await new ApiClient(app).signUp();
  const { household } = await addHousehold(client, { phone: '+447700900123' });
  const { household: abroad } = await addHousehold(client, { phone: '+351910000000' });
  setTextRules({ prefixes: ['+1', '+44'], perDay: 2, signUpsOpen: true });
  const text = async (householdId: string, now = new Date()) => {
    const row = await inBusiness(client.session!.business.id, () =>
      queueText({
        householdId,
        visitId: null,
        kind: 'onTheWay',
        promiseVersion: 0,
        fields: {
          groomerName: 'Mika',
          petNames: ['Rook'],
          arrival: { from: '9:48', to: '9:56' },
          link: 'https://vans.example.org/a/x',
        },
        now,
      }),
    );
    return [row.status, row.reason];
  };
  expect(await text(abroad.id)).toEqual([
    'notSent',
    'Texts to this country are not allowed here: call instead.',
  ]);
  expect(await text(household.id)).toEqual(['waiting', null]);
  expect(await text(household.id)).toEqual(['waiting', null]);
  expect(await text(household.id)).toEqual([
    'notSent',
    'All 2 texts the business may send in a day are used: call instead.',
  ]);
  const tomorrow = new Date(Date.now() + 25 * 3_600_000);
  expect(await text(household.id, tomorrow)).toEqual(['waiting', null]);
});
