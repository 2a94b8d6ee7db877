import { inBusiness, inTransaction } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import type { Area } from '#server/area/Area.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Membership, type RoleName } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';
import { hashPassword } from '#server/services/accounts/passwords.ts';
import { startingWeights } from '#server/services/accounts/startingWeights.ts';
import { createPlace } from '#server/services/setup/places.ts';
import { createVan } from '#server/services/setup/vans.ts';
import type { DemoSignIn } from './demoSignIns.ts';

const litre = 1000;
const rolesOf: Record<string, RoleName[]> = {
  'owner-operator': ['operator'],
  dispatcher: ['dispatcher'],
  groomer: ['groomer'],
};

/** Saltmarsh Mobile Grooming with its people, places and vans. */
export async function makeBusiness(
  area: Area,
  signIns: DemoSignIn[],
  now: Date,
): Promise<Business> {
  const business = await inTransaction(async () =>
    Business.create({
      id: newId(),
      name: 'Saltmarsh Mobile Grooming',
      timeZone: 'Atlantic/Azores',
      currency: 'EUR',
      distanceUnit: 'km',
      weightUnit: 'kg',
      areaName: area.name,
      senderPhone: '+447700900999',
      deskPhone: '+447700900998',
      priceCentsPerHour: 6500,
      calloutCents: 1500,
      weights: startingWeights,
      isDemo: true,
      createdAt: now,
    }),
  );
  await inBusiness(business.id, async () => {
    const skills: Record<string, string[]> = {
      Mika: ['large', 'hand-stripping'],
      Ines: ['cats', 'large'],
      Tobi: ['cats', 'hand-stripping', 'large'],
    };
    for (const signIn of signIns) {
      const user = await User.create({
        name: signIn.name,
        email: signIn.email,
        passwordHash: await hashPassword(signIn.password),
        createdAt: now,
      });
      const groomer =
        signIn.role === 'groomer'
          ? await Groomer.create({ name: signIn.name, skills: skills[signIn.name] ?? [] })
          : null;
      await Membership.create({
        userId: user.id,
        roles: rolesOf[signIn.role]!,
        groomerId: groomer?.id ?? null,
        createdAt: now,
      });
    }
    await makeVans(area);
  });
  return business;
}

/** Places stand at real addresses of the area: the depot in the middle, the others around it. */
async function makeVans(area: Area): Promise<void> {
  const { west, south, east, north } = area.bounds;
  const near = (share: [number, number]) =>
    area.nearestAddress(south + (north - south) * share[1], west + (east - west) * share[0])!;
  const place = (
    kind: Parameters<typeof createPlace>[0]['kind'],
    name: string,
    share: [number, number],
    fields: Partial<Parameters<typeof createPlace>[0]> = {},
  ) => {
    const { lat, lon, label } = near(share);
    return createPlace({
      kind,
      name,
      addressLabel: label,
      lat,
      lon,
      phone: null,
      opensMinutes: 0,
      closesMinutes: 1440,
      lengthMinutes: 12,
      ...fields,
    });
  };
  const depot = await place('depot', 'Saltmarsh Yard', [0.5, 0.5]);
  await place('fillAndDump', 'Quay Yard water', [0.55, 0.45], {
    opensMinutes: 360,
    closesMinutes: 1320,
  });
  await place('fillAndDump', 'North Gate wash', [0.45, 0.68], {
    opensMinutes: 420,
    closesMinutes: 1200,
  });
  await place('emergencyVet', 'Lantern Veterinary Hospital', [0.52, 0.55], {
    phone: '+447700900997',
  });
  await place('emergencyVet', 'Dunes Animal Clinic', [0.4, 0.4], {
    phone: '+447700900996',
    opensMinutes: 480,
    closesMinutes: 1200,
  });
  const vans = [
    ['Otter', 'square', 260, 70_000],
    ['Plover', 'circle', 200, 55_000],
    ['Curlew', 'triangle', 240, 70_000],
  ] as const;
  for (const [name, shape, litres, tableLimitGrams] of vans)
    await createVan({
      name,
      shape,
      startPlaceId: depot.id,
      endPlaceId: depot.id,
      tanks: [
        { kind: 'fresh', capacityMl: litres * litre },
        { kind: 'grey', capacityMl: (litres + 20) * litre },
      ],
      tableLimitGrams,
    });
}
