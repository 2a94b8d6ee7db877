import type { Ability } from '#shared/api/abilities.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';

export interface BoundEndpoint {
  endpoint: Endpoint;
  ability: Ability;
}

const bound: BoundEndpoint[] = [];

/** Notes what `handle` bound, for the OpenAPI page and for the test that no route goes unlisted. */
export function registerEndpoint(endpoint: Endpoint, ability: Ability): void {
  if (!bound.some((one) => one.endpoint === endpoint)) bound.push({ endpoint, ability });
}

export function boundEndpoints(): readonly BoundEndpoint[] {
  return bound;
}
