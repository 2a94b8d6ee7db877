import { planBOf } from '#shared/grooming/planB.ts';
import type { Style as LibraryStyle, StyleShape } from '#shared/api/styles.ts';
import type { PlanBWord, Region, RegionCut, Service } from '#shared/grooming/types.ts';

/** A style as it stands in the editor. `styleId` is the one it starts from. */
export interface StyleDraft extends Pick<
  StyleShape,
  'name' | 'species' | 'coats' | 'cuts' | 'finish' | 'services' | 'planB'
> {
  styleId: string;
  notes: string;
}

export type DraftChange =
  | { kind: 'start'; style: StyleShape }
  | { kind: 'cut'; region: Region; cut: RegionCut | null }
  | { kind: 'service'; service: Service; wanted: boolean }
  | { kind: 'planB'; part: 'services' | 'regions'; key: Region | Service; word: PlanBWord }
  | { kind: 'fields'; fields: Partial<Pick<StyleDraft, 'name' | 'coats' | 'finish' | 'notes'>> };

export function startDraft(style: StyleShape, notes: string): StyleDraft {
  const { id, name, species, coats, cuts, finish, services, planB } = style;
  return { styleId: id, name, species, coats, cuts, finish, services, planB, notes };
}

export function changeDraft(draft: StyleDraft, change: DraftChange): StyleDraft {
  switch (change.kind) {
    case 'start':
      return startDraft(change.style, draft.notes);
    case 'cut': {
      const { [change.region]: _, ...others } = draft.cuts;
      return {
        ...draft,
        cuts: change.cut ? { ...draft.cuts, [change.region]: change.cut } : others,
      };
    }
    case 'service': {
      const others = draft.services.filter((one) => one !== change.service);
      return { ...draft, services: change.wanted ? [...others, change.service] : others };
    }
    case 'planB': {
      const part = { ...draft.planB[change.part], [change.key]: change.word };
      return { ...draft, planB: { ...draft.planB, [change.part]: part } };
    }
    case 'fields':
      return { ...draft, ...change.fields };
  }
}

/** What `forecastPet` takes, its plan B completed for everything the draft works on. */
export function styleOf(draft: StyleDraft): StyleShape {
  const { styleId, notes: _, ...style } = draft;
  return { id: styleId, ...style, planB: planBOf({ id: styleId, ...style }) };
}

/** What of a pet's draft differs from its style; null where nothing does. */
export function ownParts(draft: StyleDraft, base: StyleShape) {
  const cuts: StyleShape['cuts'] = {};
  for (const region of Object.keys({ ...base.cuts, ...draft.cuts }) as Region[]) {
    // A pet's version names what differs, so a region taken out of the style is kept long.
    const cut = draft.cuts[region] ?? { tool: 'leave' as const };
    if (!same(cut, base.cuts[region])) cuts[region] = cut;
  }
  const { planB } = styleOf(draft);
  const sorted = (services: readonly string[]) => services.toSorted();
  return {
    ownCuts: Object.keys(cuts).length > 0 ? cuts : null,
    ownFinish: draft.finish === base.finish ? null : draft.finish,
    ownServices: same(sorted(draft.services), sorted(base.services)) ? null : draft.services,
    ownPlanB: same(planB, planBOf(base)) ? null : planB,
  };
}

/** Whether a style of the library may be begun with: of this species and still offered. */
export function offeredStyles(
  library: readonly LibraryStyle[],
  species: StyleShape['species'],
  keepId?: string,
): LibraryStyle[] {
  return library.filter(
    (style) => style.species === species && (!style.retired || style.id === keepId),
  );
}

/** Plain values, keys in any order. */
function same(one: unknown, other: unknown): boolean {
  return JSON.stringify(one, sortKeys) === JSON.stringify(other, sortKeys);
}

function sortKeys(_: string, value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)));
}
