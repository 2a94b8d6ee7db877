import { findBreed } from '#shared/grooming/breeds.ts';
import type { CoatType, Species, Style } from '#shared/grooming/types.ts';

/** Styles of a species, the breed's usual ones first, then those that suit the coat, then the rest. */
export function styleChoices(
  styles: readonly (Style & { retired?: boolean })[],
  species: Species,
  breedId: string | null,
  coatType: CoatType | null,
): { value: string; label: string }[] {
  const breed = breedId ? findBreed(breedId) : null;
  const coat = coatType ?? breed?.coatType ?? null;
  const usual = breed?.usualStyleIds ?? [];
  const rank = (id: string, coats: readonly CoatType[]) =>
    usual.includes(id) ? usual.indexOf(id) : coat && !coats.includes(coat) ? 200 : 100;
  return styles
    .filter((style) => style.species === species && !style.retired)
    .map((style) => ({ style, rank: rank(style.id, style.coats) }))
    .sort((a, b) => a.rank - b.rank)
    .map(({ style, rank: place }) => ({
      value: style.id,
      label: `${style.name}${place < 100 ? ' · usual' : place === 200 ? ' · not for this coat' : ''}`,
    }));
}
