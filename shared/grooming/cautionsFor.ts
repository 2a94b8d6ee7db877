import type { AgeBand } from './age.ts';
import { leftTenthsMm } from './blades.ts';
import type { Body } from './body.ts';
import { findCaution, type Caution } from './cautions.ts';
import type { CoatPlan } from './planCoat.ts';
import type { CautionKey, PetFacts, Region } from './types.ts';

/** Cautions that apply to this pet and plan, stop signs first, each once. */
export function cautionsFor(pet: PetFacts, body: Body, age: AgeBand, plan: CoatPlan): Caution[] {
  const keys: CautionKey[] = [...pet.cautions];
  if (body.breed?.shortNosed) keys.push('shortNosed');
  if (age === 'old') keys.push('senior');
  if (age === 'young') keys.push('young');
  if (pet.species === 'cat') keys.push('catHandling');
  if (plan.change) keys.push('matLimit', 'skinAfterMats');
  if (body.coatType === 'double' && cutsShort(plan)) keys.push('doubleCoatShort');
  const found = [...new Set(keys)].map(findCaution);
  return [...found.filter((each) => each.stop), ...found.filter((each) => !each.stop)];
}

/** Under an inch over the trunk: the undercoat is cut, not only the tips. */
const SHORT_TENTHS_MM = 254;

const TRUNK: readonly Region[] = ['neck', 'back', 'belly'];

function cutsShort(plan: CoatPlan): boolean {
  return TRUNK.some((region) => {
    const cut = plan.cuts[region];
    if (cut?.tool === 'scissor') return (cut.lengthTenthsMm ?? SHORT_TENTHS_MM) < SHORT_TENTHS_MM;
    return (cut?.tool === 'blade' || cut?.tool === 'comb') && leftTenthsMm(cut) < SHORT_TENTHS_MM;
  });
}
