import { describe, expect, it } from 'vitest';
import { arrivalHeadline, arrivalSentence, haveReadyLines, promiseWords } from './arrivalWords.ts';
import type { ArrivalFacts } from './arrivalWords.ts';
import { countSegments } from './countSegments.ts';
import { dateWords } from './dateWords.ts';
import { nameList } from './nameList.ts';
import { optOutWord } from './optOutWord.ts';
import { renderText } from './renderText.ts';
import { staleAt } from './staleAt.ts';
import { wallRange } from './wallRange.ts';

const businessName = 'Saltmarsh Mobile Grooming';
const arrival = { from: '9:48', to: '9:56' };

describe('renderText', () => {
  it('says when to open the door, in one or two GSM-7 parts', () => {
    const body = renderText('onTheWay', {
      businessName,
      groomerName: 'Mika',
      petNames: ['Pip', 'Juno'],
      arrival,
      link: 'https://vans.example.org/a/3q2-8Xk0Zs1_mQv7Lr9TbA',
    });
    expect(body).toBe(
      'Saltmarsh Mobile Grooming: Mika is on the way for Pip and Juno. Please open the door 9:48-9:56. Live: https://vans.example.org/a/3q2-8Xk0Zs1_mQv7Lr9TbA',
    );
    expect(countSegments(body)).toMatchObject({ encoding: 'GSM-7', segments: 1 });
  });

  it('names the day so that day and month cannot be swapped', () => {
    const promise = { from: '9:30', to: '11:30' };
    const fields = { businessName, petNames: ['Bo'], date: '2026-04-14', promise };
    expect(renderText('booked', fields)).toBe(
      'Saltmarsh Mobile Grooming: booked for Bo on Tue 14 Apr, arrival 9:30-11:30. Reply STOP to end texts.',
    );
    expect(renderText('reminder', fields)).toBe(
      "Saltmarsh Mobile Grooming: see you Tue 14 Apr, arrival 9:30-11:30, for Bo. Can't make it? Reply here. STOP ends texts.",
    );
    expect(renderText('booked', { ...fields, promise: null })).toContain('time to follow');
  });

  it('keeps typed names to one line and plain punctuation', () => {
    const body = renderText('booked', {
      businessName: 'Ann’s “Wet—Dog” van\nPay here',
      petNames: ['D’Arcy…'],
      date: '2026-04-14',
      promise: null,
    });
    expect(body).toContain('Ann\'s "Wet-Dog" van Pay here: booked for D\'Arcy...');
    expect(countSegments(body).encoding).toBe('GSM-7');
  });

  it('has no word for codes, cautions or addresses even when handed a whole household', () => {
    const household = {
      businessName,
      petNames: ['Pip'],
      date: '2026-04-14',
      promise: null,
      gateCode: '4711#',
      caution: 'bites',
      address: '12 Quay Lane',
    };
    for (const kind of ['booked', 'reminder'] as const)
      expect(renderText(kind, household)).not.toMatch(/4711|bites|Quay/);
  });
});

describe('parts of sentences', () => {
  it('lists names and counts those that do not fit', () => {
    expect(nameList([])).toBe('');
    expect(nameList(['Pip', 'Juno', 'Bo'])).toBe('Pip, Juno and Bo');
    expect(nameList(['Pip', 'Juno', 'Bo', 'Ida', 'Max'], 19)).toBe('Pip and 4 more');
    expect(nameList(['Pip', 'Juno', 'Bo', 'Ida', 'Max'], 20)).toBe('Pip, Juno and 3 more');
  });

  it('writes dates and widens ranges to whole minutes', () => {
    expect(dateWords('2026-03-01')).toBe('Sun 1 Mar');
    const day = { dayStartUtc: '2026-10-24T22:00:00.000Z', timeZone: 'Europe/Vaduz' };
    const nine = 10 * 3600;
    expect(wallRange(day, nine + 59, nine + 61)).toEqual({ from: '9:00', to: '9:02' });
    expect(wallRange(day, nine, nine + 60)).toEqual({ from: '9:00', to: '9:01' });
  });

  // Words: 47 CFR 64.1200(a)(10) and the carriers' default lists.
  it('hears the words that end and resume texts, and nothing in longer replies', () => {
    for (const said of ['STOP', ' stop. ', 'Opt out', 'unsubscribe', 'QUIT', 'End', 'Revoke'])
      expect(optOutWord(said)).toBe('stop');
    expect(optOutWord('start')).toBe('start');
    expect(optOutWord('Yes')).toBe('start');
    expect(optOutWord('help?')).toBe('help');
    for (const said of ['please stop by at 9', 'the end of the lane', '', 'non-stop'])
      expect(optOutWord(said)).toBeNull();
  });

  it('lets texts go stale by kind, sooner when their moment passes', () => {
    expect(staleAt('onTheWay', 1000, null)).toBe(1000 + 1_800_000);
    expect(staleAt('onTheWay', 1000, 601_000)).toBe(601_000);
    expect(staleAt('onTheWay', 1000, 0)).toBe(1000);
  });
});

describe('the arrival page', () => {
  const facts: ArrivalFacts = {
    state: 'onTheWay',
    businessName,
    groomerName: 'Mika',
    vanName: 'Otter',
    petNames: ['Pip', 'Juno'],
    date: '2026-04-14',
    promise: { from: '9:30', to: '11:30' },
    arrival,
    arrivedAt: null,
    doneAt: null,
    finish: null,
  };

  it('leads with when to open the door', () => {
    expect(arrivalHeadline(facts)).toBe('Open the door 9:48–9:56');
    expect(arrivalSentence(facts)).toBe(
      'Mika is on the way to Pip and Juno in van Otter. 8 times in 10 a van arrives within the range shown.',
    );
    expect(promiseWords(facts.promise)).toBe('You were told 9:30–11:30');
  });

  it('has words for every other state', () => {
    expect(arrivalHeadline({ ...facts, state: 'planned' })).toBe('Arrival 9:48–9:56');
    expect(arrivalSentence({ ...facts, state: 'planned' })).toBe(
      'Mika comes to Pip and Juno on Tue 14 Apr. You were told 9:30–11:30. As the day stands it will be 9:48–9:56.',
    );
    expect(arrivalHeadline({ ...facts, state: 'planned', arrival: null, promise: null })).toBe(
      'Tue 14 Apr, time to follow',
    );
    const arrived: ArrivalFacts = {
      ...facts,
      state: 'arrived',
      arrivedAt: '9:52',
      finish: { from: '10:40', to: '11:05' },
    };
    expect(arrivalSentence(arrived)).toContain(
      'Arrived 9:52. Pip and Juno should be done 10:40–11:05',
    );
    expect(arrivalHeadline({ ...facts, state: 'done' })).toBe('Pip and Juno are done');
    expect(arrivalSentence({ ...facts, state: 'done', doneAt: '11:02' })).toMatch(
      /^Mika finished at 11:02\. .*your vet first\.$/,
    );
    expect(arrivalSentence({ ...facts, state: 'notToday' })).toContain(businessName);
  });

  it('asks for dogs and cats in their own way', () => {
    expect(haveReadyLines(['dog'])).toHaveLength(3);
    expect(haveReadyLines(['dog', 'cat'])[1]).toBe('Cats in a closed carrier.');
  });
});
