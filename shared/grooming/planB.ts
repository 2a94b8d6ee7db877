import type { PlanB, PlanBWord, Region, Service, Style } from './types.ts';

/**
 * A style's plan B, complete for every service and region it works on: its own words first, then
 * the usual order (common practice). Nails and hygiene are health and must be done; what is clipped
 * all over must be finished once begun, or the pet goes home half cut; teeth and a neat tail can wait.
 */
export function planBOf(style: Style): PlanB {
  const services: Partial<Record<Service, PlanBWord>> = {};
  for (const service of style.services) {
    services[service] = style.planB?.services[service] ?? USUAL_SERVICES[service] ?? 'ifAllowed';
  }
  const regions: Partial<Record<Region, PlanBWord>> = {};
  for (const [name, cut] of Object.entries(style.cuts)) {
    const region = name as Region;
    if (cut.tool === 'leave') continue;
    const begun = cut.tool === 'blade' || cut.tool === 'comb';
    const usual = USUAL_REGIONS[region] ?? (begun ? 'must' : 'ifAllowed');
    regions[region] = style.planB?.regions[region] ?? usual;
  }
  return { services, regions };
}

const USUAL_SERVICES: Partial<Record<Service, PlanBWord>> = {
  nails: 'must',
  sanitary: 'must',
  teeth: 'leave',
};

/** Hair in the eyes and between the pads is more than looks. */
const USUAL_REGIONS: Partial<Record<Region, PlanBWord>> = {
  head: 'must',
  feet: 'must',
  tail: 'leave',
};
