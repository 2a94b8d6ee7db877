import type { Area } from '#server/area/Area.ts';
import { inBusiness } from '#server/db/database.ts';
import { createHousehold } from '#server/services/households/households.ts';
import { createPet } from '#server/services/households/pets.ts';
import { createSite } from '#server/services/households/sites.ts';
import { accessNotes, familyNames, firstNames, handoverNotes, petNames } from './demoNames.ts';
import { drawPet } from './drawPet.ts';
import { pick, randomFor } from './randomFor.ts';

export const householdCount = 480;
const batch = 40;

/** Households at real addresses of the area with their pets; some share a site with one gate. */
export async function makeHouseholds(
  businessId: string,
  area: Area,
  now: Date,
  onStep: (done: number, of: number) => void,
): Promise<void> {
  const random = randomFor('households');
  const { siteIds, spots } = await inBusiness(businessId, () => makeSites(businessId, area));
  const taken = new Set<number>();
  for (let start = 0; start < householdCount; start += batch) {
    await inBusiness(businessId, async () => {
      for (let i = start; i < Math.min(start + batch, householdCount); i++) {
        const siteIndex = i % 30 === 7 ? ((i / 30) % siteIds.length) | 0 : null;
        const address = siteIndex === null ? freeAddress(area, random, taken) : spots[siteIndex]!;
        await makeHousehold(
          businessId,
          random,
          i,
          address,
          siteIndex === null ? null : siteIds[siteIndex]!,
          now,
        );
      }
    });
    onStep(Math.min(start + batch, householdCount), householdCount);
  }
}

async function makeHousehold(
  businessId: string,
  random: () => number,
  index: number,
  address: { label: string; lat: number; lon: number },
  siteId: string | null,
  now: Date,
): Promise<void> {
  const name = familyNames[(index * 37) % familyNames.length]!;
  const household = await createHousehold(
    businessId,
    {
      name,
      addressLabel: address.label,
      lat: address.lat,
      lon: address.lon,
      siteId,
      accessNotes: pick(random, accessNotes),
      handoverNotes: pick(random, handoverNotes),
      gateCode: random() < 0.12 ? String(1000 + Math.floor(random() * 9000)) : null,
      contactName: `${pick(random, firstNames)} ${name}`,
      // 07700 900000–900999 are set aside for stories (Ofcom), so nobody's phone can ring.
      phone: `+44770090${String(index % 990).padStart(4, '0')}`,
      textsConsent: random() < 0.92,
      secondContactName: '',
      secondContactPhone: null,
    },
    now,
  );
  const pets = random() < 0.78 ? 1 : 2;
  const names = new Set<string>();
  while (names.size < pets) names.add(pick(random, petNames));
  for (const petName of names)
    await createPet(household.id, drawPet(random, petName, now.getUTCFullYear()), now);
}

async function makeSites(businessId: string, area: Area) {
  const random = randomFor('sites');
  const names = ['Tidewater Court', 'Lantern House', 'Marram Gardens', 'Old Ropewalk'];
  const siteIds: string[] = [];
  const spots: { label: string; lat: number; lon: number }[] = [];
  for (const name of names) {
    const { label, lat, lon } = area.addressAt(Math.floor(random() * area.addressCount));
    const { site } = await createSite(businessId, {
      name,
      lat,
      lon,
      parkingNotes: 'Visitors’ bay beside the gate; height limit 2.9 m.',
      gateCode: String(1000 + Math.floor(random() * 9000)),
    });
    siteIds.push(site.id);
    spots.push({ label, lat, lon });
  }
  return { siteIds, spots };
}

function freeAddress(area: Area, random: () => number, taken: Set<number>) {
  for (;;) {
    const index = Math.floor(random() * area.addressCount);
    if (taken.has(index)) continue;
    taken.add(index);
    return area.addressAt(index);
  }
}
