import { gunzipSync } from 'node:zlib';
import { Router } from 'express';
import type { Area } from './Area.ts';
import { areaFor } from './openAreas.ts';

/**
 * Answers `/tiles/:area/:version/:z/:x/:y.mvt` with whole vector tiles, for anyone: a map tells nothing
 * about a business. The version in the address makes every answer immutable. 204 where the map is
 * blank, 404 for an unknown area, an old version or a malformed address.
 */
export function tileRouter(find: (name: string) => Area | null = areaFor): Router {
  const router = Router();
  router.get('/tiles/:area/:version/:z/:x/:file', (request, response) => {
    const { area: name, version, z, x, file } = request.params;
    const area = find(name);
    const y = file.match(/^(\d{1,8})\.mvt$/)?.[1];
    if (area?.version !== version || !/^\d{1,2}$/.test(z) || !/^\d{1,8}$/.test(x) || !y) {
      response.status(404).type('text').send('No such map tile.');
      return;
    }
    response.set('Cache-Control', 'public, max-age=31536000, immutable');
    const tile = area.tile(Number(z), Number(x), Number(y));
    if (!tile) {
      response.status(204).end();
      return;
    }
    response.set('ETag', tile.etag).set('Vary', 'Accept-Encoding');
    response.type('application/vnd.mapbox-vector-tile');
    if (request.acceptsEncodings('gzip')) {
      response.set('Content-Encoding', 'gzip').send(tile.data);
    } else {
      response.send(gunzipSync(tile.data));
    }
  });
  return router;
}
