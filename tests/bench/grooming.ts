/**
 * Time of a forecast: `npx tsx tests/bench/grooming.ts`. Every breed in each of its usual styles, in
 * CPU time of the process; the bound is 0.2 ms a forecast, plan B and all.
 */
import { breeds } from '#shared/grooming/breeds.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { forecastVisit } from '#shared/grooming/forecastVisit.ts';
import { goodCoat, petLike } from '#shared/grooming/petLike.ts';
import { findStyle } from '#shared/grooming/styles.ts';

const usual = breeds.flatMap(({ id, species, usualStyleIds }) =>
  usualStyleIds.map((styleId) => ({
    pet: petLike({ species, breedId: id, weightGrams: null, coatType: null }),
    style: findStyle(styleId),
  })),
);
const hard = usual.map(({ pet, style }) => ({
  pet: {
    ...pet,
    ageYears: 14,
    temperament: 'restless' as const,
    cautions: ['heart', 'weakJoints'] as const,
    coatState: { ...goodCoat, mattingByRegion: { ears: 2, belly: 1, hindLegs: 4 } as const },
    weeksSinceLast: 20,
    tableLimitSeconds: 1_800,
  },
  style,
}));

print('pet in good order', usual.length, () => {
  for (const { pet, style } of usual) forecastPet(pet, style);
});
print('old, ill, matted, plan B', hard.length, () => {
  for (const { pet, style } of hard) forecastPet(pet, style);
});
print('stop of two pets', usual.length, () => {
  for (const { pet, style } of usual) {
    forecastVisit([
      { petId: 'a', name: 'a', pet, style },
      { petId: 'b', name: 'b', pet, style },
    ]);
  }
});

/** Warm, then the middle of eleven rounds. */
function print(name: string, forecasts: number, round: () => void): void {
  for (let i = 0; i < 5; i += 1) round();
  const rounds = Array.from({ length: 11 }, () => {
    const from = cpuMs();
    round();
    return (cpuMs() - from) / forecasts;
  }).sort((a, b) => a - b);
  console.log(`${name.padEnd(26)} ${rounds[5]!.toFixed(4)} ms a forecast, ${forecasts} of them`);
}

/** CPU time of this process: the machine is shared, wall time lies. */
function cpuMs(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
}
