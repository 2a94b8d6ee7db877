import { expect, test } from 'vitest';
import { addressOf } from './sendRequest.ts';

test('path parts are filled in and escaped, the query leaves out what is not given', () => {
  expect(
    addressOf('/api/days/:date/pins/:visitId', { date: '2026-04-14', visitId: 'a/b' }, {}),
  ).toBe('/api/days/2026-04-14/pins/a%2Fb');
  expect(addressOf('/api/households', {}, { text: 'O’Neil & co', page: 2, site: undefined })).toBe(
    '/api/households?text=O%E2%80%99Neil+%26+co&page=2',
  );
});

test('a missing path part is a mistake in our code and says which', () => {
  expect(() => addressOf('/api/pets/:petId', {}, {})).toThrow('/api/pets/:petId needs petId');
});
