import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { AREA_FORMAT, type AreaMeta } from '#tiles/AreaMeta.ts';
import { importArea, type ImportProgress } from '#tiles/importArea.ts';
import { TILE_FORMAT } from '#tiles/layers.ts';
import { CAR_PROFILE_VERSION } from '#tiles/roads/carProfile.ts';
import { TOWN_VERSION } from '#tiles/town/drawTown.ts';
import { writeTown } from '#tiles/town/writeTown.ts';
import { readAreaMeta } from './openArea.ts';

export const DEMO_AREA = 'pellan-bay';

const SOURCE = `pellan-bay ${TOWN_VERSION}.${AREA_FORMAT}.${TILE_FORMAT}.${CAR_PROFILE_VERSION}`;

/** Draws Pellan Bay and imports it as `pellan-bay`; does nothing when this very town is there already. */
export async function importDemoArea(
  dataDir: string,
  onProgress?: (progress: ImportProgress) => void,
): Promise<AreaMeta> {
  const areas = join(dataDir, 'areas');
  const outDir = join(areas, DEMO_AREA);
  const present = readAreaMeta(outDir);
  if (present?.source === SOURCE) return present;
  await mkdir(areas, { recursive: true });
  const file = join(areas, `${DEMO_AREA}.${process.pid}.osm.pbf`);
  try {
    writeTown(file);
    return await importArea({
      file,
      outDir,
      name: DEMO_AREA,
      attribution: 'Pellan Bay is an invented town',
      source: SOURCE,
      onProgress,
    });
  } finally {
    await rm(file, { force: true });
  }
}
