import { dateWords } from './dateWords.ts';
import { nameList } from './nameList.ts';
import { screenRange, type WallRange } from './wallRange.ts';

export type ArrivalState = 'planned' | 'onTheWay' | 'arrived' | 'done' | 'notToday';

/** All the arrival page's words may know: one household's facts, no address, code or caution. */
export interface ArrivalFacts {
  state: ArrivalState;
  businessName: string;
  groomerName: string;
  vanName: string;
  petNames: readonly string[];
  /** YYYY-MM-DD. */
  date: string;
  promise: WallRange | null;
  /** Forecast arrival, from the 1-in-10 early to the 1-in-10 late; null while nobody knows. */
  arrival: WallRange | null;
  /** When work began and ended, as wall times, once known. */
  arrivedAt: string | null;
  doneAt: string | null;
  /** Forecast end of the visit while it is under way. */
  finish: WallRange | null;
}

/** The page's largest line: what to do, or how it stands. */
export function arrivalHeadline(facts: ArrivalFacts): string {
  const pets = nameList(facts.petNames);
  switch (facts.state) {
    case 'onTheWay':
      return facts.arrival ? `Open the door ${screenRange(facts.arrival)}` : 'On the way';
    case 'planned': {
      const range = facts.arrival ?? facts.promise;
      return range ? `Arrival ${screenRange(range)}` : `${dateWords(facts.date)}, time to follow`;
    }
    case 'arrived':
      return `${facts.groomerName} is with you`;
    case 'done':
      return `${pets} ${facts.petNames.length > 1 ? 'are' : 'is'} done`;
    case 'notToday':
      return 'Not today';
  }
}

/** The one or two sentences below the headline; they must read alone, without script or map. */
export function arrivalSentence(facts: ArrivalFacts): string {
  const pets = nameList(facts.petNames);
  const { groomerName, vanName, promise, arrival } = facts;
  switch (facts.state) {
    case 'onTheWay':
      return `${groomerName} is on the way to ${pets} in van ${vanName}. ${
        !arrival
          ? 'The arrival time follows here.'
          : arrival.from === arrival.to
            ? 'The van may park earlier and waits until then.'
            : '8 times in 10 a van arrives within the range shown.'
      }`;
    case 'planned': {
      const told = promise ? ` You were told ${screenRange(promise)}.` : '';
      const now = arrival ? ` As the day stands it will be ${screenRange(arrival)}.` : '';
      return `${groomerName} comes to ${pets} on ${dateWords(facts.date)}.${told}${now}`;
    }
    case 'arrived':
      return `${facts.arrivedAt ? `Arrived ${facts.arrivedAt}. ` : ''}${
        facts.finish
          ? `${pets} should be done ${screenRange(facts.finish)}; some pets need longer, and nobody will hurry.`
          : `${pets} ${facts.petNames.length > 1 ? 'are' : 'is'} in good hands.`
      }`;
    case 'done':
      return `${groomerName} finished${facts.doneAt ? ` at ${facts.doneAt}` : ''}. Call ${facts.businessName} if anything about ${pets} worries you; for a sick or hurt pet call your vet first.`;
    case 'notToday':
      return `This visit could not happen. ${facts.businessName} will find another time with you.`;
  }
}

/** 'You were told 9:30–11:30', or null without a promise. */
export function promiseWords(promise: WallRange | null): string | null {
  return promise ? `You were told ${screenRange(promise)}` : null;
}

/** What a household should have ready at the door. Common practice; a vet's advice goes first. */
export function haveReadyLines(species: readonly ('dog' | 'cat')[]): string[] {
  return [
    ...(species.includes('dog') ? ['Dogs on a lead, after a short walk if you can.'] : []),
    ...(species.includes('cat') ? ['Cats in a closed carrier.'] : []),
    'Before work begins, say what is new: lumps, sores, fleas, medicine, heat, a bad day. An ill pet sees the vet first.',
    'Stay within reach of your phone until your pet is back.',
  ];
}
