import type { z } from 'zod';
import type { groomFit } from '#shared/api/learning.ts';
import type { GroomFit } from '#server/models/GroomFit.ts';

export function presentFit(row: GroomFit): z.input<typeof groomFit> {
  const { id, modelVersion, records, leftOut, heldOut, beforeSeconds, afterSeconds } = row;
  return {
    id,
    state: row.state === 'done' ? (row.kept ? 'kept' : 'notKept') : row.state,
    fittedAt: row.fittedAt.toISOString(),
    modelVersion,
    records,
    leftOut,
    heldOut,
    beforeSeconds,
    afterSeconds,
  };
}
