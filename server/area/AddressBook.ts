import Fuse from 'fuse.js';
import MiniSearch from 'minisearch';
import { distanceMetres, type LatLon } from '#shared/travel/distanceMetres.ts';
import type { AddressTable } from '#tiles/collectAddresses.ts';
import { E7 } from '#tiles/osm/NodeStore.ts';
import { addressLabel } from './addressLabel.ts';
import { addressQuery, addressWords } from './addressWords.ts';
import type { Address, FoundAddress } from './Area.ts';

interface StreetDoc {
  id: number;
  street: string;
  city: string;
  postcode: string;
  /** All of it in index form, for the fuzzy fallback. */
  whole: string;
}

/** Streets looked at before houses are chosen. */
const MOST_STREETS = 12;
/** A street this far away counts half of one at the door. */
const HALF_WORTH_METRES = 15_000;
/**
 * A street that has the asked-for number beats its namesake in the next town that has not, but not a
 * street that fits the words much better.
 */
const NUMBER_WORTH = 1.4;

interface RankedStreet {
  id: number;
  score: number;
}

/**
 * Forgiving address search: streets are searched, house numbers looked up. MiniSearch answers nearly
 * everything; Fuse only what it finds nothing for, because it is fifty times slower.
 */
export class AddressBook {
  readonly count: number;
  readonly #table: AddressTable;
  readonly #housesOf: number[][];
  readonly #search: MiniSearch<StreetDoc>;
  readonly #docs: StreetDoc[];
  readonly #postcodes: Set<string>;
  #fuse: Fuse<StreetDoc> | undefined;

  constructor(table: AddressTable) {
    this.#table = table;
    this.count = table.house.length;
    this.#housesOf = table.streets.map(() => []);
    table.house.forEach((street, house) => this.#housesOf[street]!.push(house));
    for (const houses of this.#housesOf)
      houses.sort((a, b) => leadingNumber(table.number[a]!) - leadingNumber(table.number[b]!));
    this.#docs = table.streets.map(({ street, city, postcode }, id) => {
      const form = (text: string) => addressWords(text).join(' ');
      const [s, c, p] = [form(street), form(city), form(postcode)];
      return { id, street: s, city: c, postcode: p, whole: `${s} ${c} ${p}` };
    });
    this.#postcodes = new Set(this.#docs.map(({ postcode }) => postcode));
    this.#search = new MiniSearch<StreetDoc>({
      fields: ['street', 'city', 'postcode'],
      tokenize: (text) => text.split(' '),
      processTerm: (term) => term || null,
      searchOptions: {
        boost: { street: 3 },
        prefix: (term, i, terms) => i === terms.length - 1 || term.length > 3,
        fuzzy: (term) => (term.length > 3 ? 0.25 : false),
      },
    });
    this.#search.addAll(this.#docs);
  }

  find(text: string, near: LatLon | undefined, limit: number): FoundAddress[] {
    const { words, number } = addressQuery(text, (word) => this.#postcodes.has(word));
    if (words.length === 0) return [];
    const streets = this.#streets(words, near);
    if (number === null) {
      const perStreet = Math.max(1, Math.ceil(limit / streets.length));
      return streets
        .flatMap(({ id }) => this.#housesOf[id]!.slice(0, perStreet))
        .slice(0, limit)
        .map((house) => ({ ...this.at(house), exact: true }));
    }
    const found = streets.map(({ id, score }) => {
      const { house, exact } = this.#houseNumbered(this.#housesOf[id]!, number);
      return { house, exact, score: exact ? score * NUMBER_WORTH : score };
    });
    found.sort((a, b) => b.score - a.score);
    return found.slice(0, limit).map(({ house, exact }) => ({ ...this.at(house), exact }));
  }

  nearest(lat: number, lon: number): (Address & { metres: number }) | null {
    const { latE7, lonE7 } = this.#table;
    const shrink = Math.cos((lat * Math.PI) / 180) ** 2;
    let best = -1;
    let least = Infinity;
    for (let i = 0; i < this.count; i++) {
      const dLat = latE7[i]! / E7 - lat;
      const dLon = lonE7[i]! / E7 - lon;
      const distance = dLat * dLat + dLon * dLon * shrink;
      if (distance < least) {
        least = distance;
        best = i;
      }
    }
    if (best < 0) return null;
    const address = this.at(best);
    return { ...address, metres: Math.round(distanceMetres({ lat, lon }, address)) };
  }

  at(index: number): Address {
    const street = this.#table.streets[this.#table.house[index] ?? -1];
    if (!street) throw new RangeError(`There is no address ${index}; there are ${this.count}.`);
    const houseNumber = this.#table.number[index]!;
    return {
      id: String(index),
      label: addressLabel(street.street, houseNumber, street.city, street.postcode),
      street: street.street,
      houseNumber,
      city: street.city,
      postcode: street.postcode,
      lat: this.#table.latE7[index]! / E7,
      lon: this.#table.lonE7[index]! / E7,
    };
  }

  #streets(words: readonly string[], near: LatLon | undefined): RankedStreet[] {
    const text = words.join(' ');
    const worth = (id: number) => {
      if (!near) return 1;
      const house = this.at(this.#housesOf[id]![0]!);
      return 1 / (1 + distanceMetres(near, house) / HALF_WORTH_METRES);
    };
    const ranked = (combineWith: 'AND' | 'OR') =>
      this.#search
        .search(text, { combineWith })
        .map(({ id, score }) => ({ id: id as number, score: score * worth(id as number) }))
        .sort((a, b) => b.score - a.score || a.id - b.id)
        .slice(0, MOST_STREETS);
    const found = ranked('AND');
    if (found.length > 0) return found;
    const guessed = this.#fuzzy(text);
    return guessed.length > 0 ? guessed : ranked('OR');
  }

  #fuzzy(text: string): RankedStreet[] {
    this.#fuse ??= new Fuse(this.#docs, {
      keys: [
        { name: 'street', weight: 2 },
        { name: 'whole', weight: 1 },
      ],
      threshold: 0.4,
      ignoreLocation: true,
      includeScore: true,
    });
    return this.#fuse
      .search(text, { limit: MOST_STREETS })
      .map(({ item, score = 1 }) => ({ id: item.id, score: 1 - score }));
  }

  #houseNumbered(houses: readonly number[], number: string): { house: number; exact: boolean } {
    const form = (text: string) => text.toLowerCase().replaceAll(' ', '');
    const exact = houses.find((house) => form(this.#table.number[house]!) === number);
    if (exact !== undefined) return { house: exact, exact: true };
    const wanted = leadingNumber(number);
    const off = (house: number) => Math.abs(leadingNumber(this.#table.number[house]!) - wanted);
    const house = houses.reduce((best, candidate) =>
      off(candidate) < off(best) ? candidate : best,
    );
    return { house, exact: false };
  }
}

function leadingNumber(houseNumber: string): number {
  const value = Number.parseInt(houseNumber, 10);
  return Number.isNaN(value) ? 0 : value;
}
