import type { z } from 'zod';
import type { groomFit } from '#shared/api/learning.ts';
import type { GroomFit } from '#server/models/GroomFit.ts';

export function presentFit(row: GroomFit): z.input<typeof groomFit> {
  const { id, modelVersion, records, leftOut, heldOut, beforeSeconds, afterSeconds, kept } = row;
  return {
    id,
    fittedAt: row.fittedAt.toISOString(),
    modelVersion,
    records,
    leftOut,
    heldOut,
    beforeSeconds,
    afterSeconds,
    kept,
  };
}
