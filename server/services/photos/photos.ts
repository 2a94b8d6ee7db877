import { afterCommit } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { badField, notFound } from '#server/errors.ts';
import { log } from '#server/log.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { Photo } from '#server/models/Photo.ts';
import { needPet } from '#server/services/households/pets.ts';
import { currentVersion } from '#server/services/styles/petVersions.ts';
import { dropPhotoFile, readPhotoFile, writePhoto } from './photoFiles.ts';
import { readPhoto } from './readPhoto.ts';

export interface PhotoInput {
  petId: string;
  version: number;
  /** As sent; null when no file came. */
  file: Buffer | null;
}

const mostPerVersion = 12;

/** Keeps a photo with a version of a pet's style: the file first, then its row. */
export async function addPhoto(
  businessId: string,
  input: PhotoInput,
  now: Date,
): Promise<{ photo: Photo; row: PetStyle }> {
  await needPet(input.petId);
  if (!input.file) throw badField('photo', 'must be one file, sent as multipart/form-data');
  const plain = await readPhoto(input.file);
  const row = await needVersion(input.petId, input.version);
  if ((await Photo.count({ where: { petStyleId: row.id } })) >= mostPerVersion)
    throw badField('photo', `must be one of at most ${mostPerVersion} a version: remove one first`);
  const id = newId();
  const fileName = `${id}.jpg`;
  await writePhoto(businessId, fileName, plain.data);
  const { data, ...facts } = plain;
  const photo = await Photo.create({ id, petStyleId: row.id, fileName, bytes: data.length, takenAt: now, ...facts }); // prettier-ignore
  return { photo, row };
}

/** The version, under the pet's lock: the count of its photos and a first row must not be raced. */
async function needVersion(petId: string, version: number): Promise<PetStyle> {
  const pet = await needPet(petId, true);
  const row = await PetStyle.findOne({ where: { petId, version } });
  if (row) return row;
  const current = await currentVersion(pet);
  if (!current.isNewRecord || version !== 1) throw notFound('version of this style');
  return current.save();
}

export async function getPhoto(businessId: string, photoId: string): Promise<Buffer> {
  const photo = await needPhoto(photoId);
  const data = await readPhotoFile(businessId, photo.fileName);
  if (!data) throw notFound('photo');
  return data;
}

/** The row goes first; a file left behind by a crash between is swept later. */
export async function removePhoto(businessId: string, photoId: string): Promise<void> {
  const photo = await needPhoto(photoId);
  await photo.destroy();
  afterCommit(() => {
    dropPhotoFile(businessId, photo.fileName).catch((error: unknown) =>
      log.warn({ err: error, photoId }, 'a removed photo’s file stays until the sweep'),
    );
  });
}

async function needPhoto(photoId: string): Promise<Photo> {
  const photo = await Photo.findByPk(photoId);
  if (!photo) throw notFound('photo');
  return photo;
}
