import type { z } from 'zod';
import type { petStyle } from '#shared/api/petStyles.ts';
import type { photo } from '#shared/api/photos.ts';
import type { style, styleShape } from '#shared/api/styles.ts';
import { planBOf } from '#shared/grooming/planB.ts';
import type { Style } from '#shared/grooming/types.ts';
import type { PetStyle } from '#server/models/PetStyle.ts';
import type { Photo } from '#server/models/Photo.ts';

export function presentStyleShape(row: Style): z.input<typeof styleShape> {
  return {
    id: row.id,
    name: row.name,
    species: row.species,
    coats: [...row.coats],
    cuts: row.cuts,
    finish: row.finish,
    services: [...row.services],
    planB: planBOf(row),
  };
}

export function presentStyle(facts: {
  style: Style;
  source: 'starting' | 'own';
  basedOn: string | null;
  retired: boolean;
}): z.input<typeof style> {
  const { source, basedOn, retired } = facts;
  return { ...presentStyleShape(facts.style), source, basedOn, retired };
}

export function presentPetStyle(facts: {
  row: PetStyle;
  style: Style;
  photos: Photo[];
}): z.input<typeof petStyle> {
  const { row } = facts;
  return {
    petId: row.petId,
    version: row.version,
    styleId: row.styleId,
    styleName: facts.style.name,
    ownCuts: row.ownCuts ?? null,
    ownFinish: row.ownFinish ?? null,
    ownServices: row.ownServices ?? null,
    ownPlanB: row.ownPlanB ?? null,
    style: presentStyleShape(facts.style),
    notes: row.notes,
    madeAt: row.madeAt?.toISOString() ?? null,
    madeBy: row.madeBy,
    photos: facts.photos.map((one) => presentPhoto({ photo: one, row })),
  };
}

export function presentPhoto(facts: { photo: Photo; row: PetStyle }): z.input<typeof photo> {
  const { photo: one, row } = facts;
  return {
    id: one.id,
    petId: row.petId,
    version: row.version,
    url: `/api/photos/${one.id}`,
    width: one.width,
    height: one.height,
    bytes: one.bytes,
    takenAt: one.takenAt.toISOString(),
  };
}
