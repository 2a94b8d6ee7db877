import { describe, expect, it } from 'vitest';
import type { AddressTable } from '#tiles/collectAddresses.ts';
import { AddressBook } from './AddressBook.ts';
import { addressLabel } from './addressLabel.ts';
import { addressQuery, addressWords } from './addressWords.ts';

const STREETS = [
  ['Tern Street', 'Pellan Bay', '7101', 41.001],
  ['Tern Lane', 'Pellan Bay', '7101', 41.002],
  ['Tern Street', 'Skerrow', '7127', 41.2],
  ['St Osla Road', 'Pellan Bay', '7103', 41.003],
  ['Upper Kingfisher Crescent', 'Larkhill', '7108', 41.004],
  ['Fürst-Franz-Josef-Strasse', 'Vaduz', '9490', 47.14],
] as const;

function tableOf(): AddressTable {
  const table: AddressTable = { streets: [], house: [], number: [], latE7: [], lonE7: [] };
  STREETS.forEach(([street, city, postcode, lat], id) => {
    table.streets.push({ street, city, postcode });
    for (const number of ['1', '3', '8', '12', '12a', '40']) {
      table.house.push(id);
      table.number.push(number);
      table.latE7.push(Math.round(lat * 1e7) + Number.parseInt(number, 10));
      table.lonE7.push(-360000000);
    }
  });
  return table;
}

const book = new AddressBook(tableOf());
const first = (text: string, near?: { lat: number; lon: number }) => {
  const [found] = book.find(text, near, 5);
  return found && `${found.street} ${found.houseNumber}, ${found.city}${found.exact ? '' : ' ~'}`;
};

describe('AddressBook', () => {
  it.each([
    ['12 Tern Street', 'Tern Street 12, Pellan Bay'],
    ['Tern Street 12', 'Tern Street 12, Pellan Bay'],
    ['tern st 12 skerrow', 'Tern Street 12, Skerrow'],
    ['12A tern st', 'Tern Street 12a, Pellan Bay'],
    ['8 tern ln', 'Tern Lane 8, Pellan Bay'],
    ['7127 tern street 3', 'Tern Street 3, Skerrow'],
    ['12 st osla rd', 'St Osla Road 12, Pellan Bay'],
    ['saint osla road 12', 'St Osla Road 12, Pellan Bay'],
    ['40 uper kingfsher cres', 'Upper Kingfisher Crescent 40, Larkhill'],
    ['furst franz josef str 8', 'Fürst-Franz-Josef-Strasse 8, Vaduz'],
    ['kingf', 'Upper Kingfisher Crescent 1, Larkhill'],
    ['11 Tern Lane', 'Tern Lane 12, Pellan Bay ~'],
  ])('finds %s', (text, expected) => {
    expect(first(text)).toBe(expected);
  });

  it('prefers what is near', () => {
    expect(first('tern street 12', { lat: 41.21, lon: -36 })).toBe('Tern Street 12, Skerrow');
    expect(first('tern street 12', { lat: 41.0, lon: -36 })).toBe('Tern Street 12, Pellan Bay');
  });

  it('finds nothing in nothing', () => {
    expect(book.find('', undefined, 5)).toEqual([]);
    expect(book.find('  ,,', undefined, 5)).toEqual([]);
    expect(book.find('qqqqzzzz', undefined, 5)).toEqual([]);
  });

  it('keeps to the limit', () => {
    expect(book.find('tern', undefined, 3)).toHaveLength(3);
  });

  it('knows the door next to a pin', () => {
    expect(book.nearest(41.2, -36)).toMatchObject({ city: 'Skerrow', houseNumber: '1', metres: 0 });
    expect(() => book.at(99)).toThrow('There is no address 99');
  });
});

describe('addressWords', () => {
  it('writes out what people shorten', () => {
    expect(addressWords("St. Mary's Rd N")).toEqual(['saint', 'marys', 'road', 'north']);
    expect(addressWords('Landstr.')).toEqual(['landstrasse']);
  });

  it('takes the number from wherever it stands, but not a postcode', () => {
    const isPostcode = (word: string) => word === '7101';
    expect(addressQuery('7101 Gull Row 4b', isPostcode)).toEqual({
      words: ['7101', 'gull', 'row'],
      number: '4b',
    });
    expect(addressQuery('Gull Row', isPostcode).number).toBeNull();
  });
});

describe('addressLabel', () => {
  it('puts the number where the street name’s language does', () => {
    expect(addressLabel('Tern Street', '12', 'Pellan Bay', '7101')).toBe(
      '12 Tern Street, Pellan Bay 7101',
    );
    expect(addressLabel('Landstrasse', '12', 'Vaduz', '9490')).toBe('Landstrasse 12, 9490 Vaduz');
    expect(addressLabel('Landstrasse', '12', '', '')).toBe('Landstrasse 12');
  });
});
