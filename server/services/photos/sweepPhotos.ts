import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { Photo } from '#server/models/Photo.ts';
import { dropPhotoFile, oldPhotoFiles } from './photoFiles.ts';

const dayMs = 86_400_000;
const batch = 500;

/**
 * Removes photo files no row knows, a day after they were written: of uploads broken off between file
 * and row, and of rows removed. Younger ones may be an upload under way.
 */
export async function sweepPhotos(now: Date): Promise<number> {
  let swept = 0;
  for (const [businessId, names] of await oldPhotoFiles(new Date(now.getTime() - dayMs))) {
    for (let from = 0; from < names.length; from += batch) {
      const some = names.slice(from, from + batch);
      const rows = await unsafeAcrossBusinesses(() =>
        Photo.findAll({ where: { fileName: some }, attributes: ['id', 'businessId', 'fileName'] }),
      );
      const kept = new Set(
        rows.filter((row) => row.businessId === businessId).map((row) => row.fileName),
      );
      const orphans = some.filter((name) => !kept.has(name));
      for (const name of orphans) await dropPhotoFile(businessId, name);
      swept += orphans.length;
    }
  }
  return swept;
}
