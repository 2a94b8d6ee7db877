import { planBOf } from './planB.ts';
import type { PlanB, Service, Style } from './types.ts';

/** What one pet has otherwise than its style; null: as the style. */
export interface OwnStyle {
  /** Only the regions that differ; `leave` takes a region out of the plan. */
  ownCuts: Style['cuts'] | null;
  ownFinish: Style['finish'] | null;
  ownServices: readonly Service[] | null;
  ownPlanB: PlanB | null;
}

/** A style with one pet's changes laid over it, its plan B complete again. */
export function styleForPet(style: Style, own: OwnStyle | null): Style {
  const { ownCuts = null, ownFinish = null, ownServices = null, ownPlanB = null } = own ?? {};
  const laid: Style = {
    ...style,
    cuts: { ...style.cuts, ...ownCuts },
    finish: ownFinish ?? style.finish,
    services: ownServices ?? style.services,
    planB: {
      services: { ...style.planB?.services, ...ownPlanB?.services },
      regions: { ...style.planB?.regions, ...ownPlanB?.regions },
    },
  };
  return { ...laid, planB: planBOf(laid) };
}
