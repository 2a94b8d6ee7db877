import { app, useApp } from '../support/useApp.ts';
import { mkdirSync, readdirSync, readFileSync, utimesSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { addPetStyle, listPetStyles } from '#shared/api/petStyles.ts';
import { getPhoto, mostPhotoBytes, removePhoto, type Photo } from '#shared/api/photos.ts';
import { inBusiness } from '#server/db/database.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { Photo as PhotoRow } from '#server/models/Photo.ts';
import { sweepPhotos } from '#server/services/photos/sweepPhotos.ts';
import { ApiClient } from '../support/apiClient.ts';
import { addHousehold } from '../support/buildBusiness.ts';

useApp();

async function clover() {
  const client = await new ApiClient(app).signUp();
  const { pet } = await addHousehold(client);
  const send = (file: Buffer | null, options: { version?: number; field?: string } = {}) => {
    const call = client.agent
      .post(`/api/pets/${pet.id}/styles/${options.version ?? 1}/photos`)
      .set('X-Furlong-Csrf', client.session!.csrfToken);
    return file ? call.attach(options.field ?? 'photo', file, 'rook.exe') : call;
  };
  const folder = join(process.env.FURLONG_DATA!, 'photos', client.session!.business.id);
  const files = () => {
    mkdirSync(folder, { recursive: true });
    return readdirSync(folder).sort();
  };
  return { client, pet, send, folder, files, params: { petId: pet.id } };
}

const plain = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#a0522d' } });

/** Upright 300 × 200 lying on its side, with a camera's name and a place in Greenwich. */
const withPlace = () =>
  plain(300, 200)
    .jpeg()
    .withExif({
      IFD0: { Make: 'Spycam', Orientation: '6' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 28/1 40/1' },
    })
    .withMetadata({ orientation: 6 })
    .toBuffer();

const uint16 = (value: number) => Buffer.from([value >> 8, value & 255]);

describe('a photo', () => {
  it('is kept upright as a JPEG without its place, and served to the business only', async () => {
    const { client, send, files, folder, params } = await clover();
    const sent = await withPlace();
    const { exif } = await sharp(sent).metadata();
    // Tag 0x8825 points to the place (Exif 2.32, 4.6.3), in either byte order.
    expect([0x2588, 0x8825].some((tag) => exif!.includes(uint16(tag)))).toBe(true);
    expect(sent.includes('Spycam')).toBe(true);
    const answer = await send(sent);
    expect(answer.status).toBe(200);
    const photo = answer.body as Photo;
    // Orientation 6 (Exif 2.32): the picture is turned a quarter.
    expect(photo).toMatchObject({ version: 1, width: 200, height: 300 });
    expect(files()).toEqual([`${photo.id}.jpg`]);
    const kept = readFileSync(join(folder, files()[0]!));
    expect(kept.length).toBe(photo.bytes);
    const facts = await sharp(kept).metadata();
    expect([facts.format, facts.exif, facts.iptc, facts.xmp, facts.orientation]).toEqual([
      'jpeg',
      undefined,
      undefined,
      undefined,
      undefined,
    ]);
    expect(kept.includes('Spycam') || kept.includes('Exif')).toBe(false);
    const shown = await client.agent.get(photo.url);
    expect(shown.status).toBe(200);
    expect(shown.headers).toMatchObject({
      'content-type': 'image/jpeg',
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, max-age=86400, immutable',
    });
    expect(Buffer.compare(shown.body as Buffer, kept)).toBe(0);
    const [version] = await client.must(listPetStyles, { params });
    expect(version!.photos).toEqual([photo]);
    const stranger = await new ApiClient(app).signUp();
    expect((await stranger.agent.get(photo.url)).status).toBe(404);
    expect((await new ApiClient(app).agent.get(photo.url)).status).toBe(401);
    const foreign = { params: { photoId: photo.id } };
    expect((await stranger.call(removePhoto, foreign)).status).toBe(404);
    expect(files()).toHaveLength(1);
  });

  it('is made at most 1600 pixels a side, also from PNG, WebP and AVIF', async () => {
    const { send } = await clover();
    const big = await send(await plain(3200, 1000).png().toBuffer());
    expect(big.body).toMatchObject({ width: 1600, height: 500 });
    for (const file of [
      await plain(40, 30).webp().toBuffer(),
      await plain(40, 30).avif({ effort: 0 }).toBuffer(),
    ])
      expect((await send(file)).body).toMatchObject({ width: 40, height: 30 });
  });

  it('of another type, broken or too large is refused in words', async () => {
    const { send, files } = await clover();
    const jpeg = await plain(400, 300).jpeg().toBuffer();
    const type = 'must be a JPEG, PNG, WebP or AVIF picture';
    for (const [file, field, words] of [
      [Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'photo', type],
      [Buffer.from('GIF89a\u0001\u0000\u0001\u0000\u0000\u0000\u0000;'), 'photo', type],
      [Buffer.from('MZ not a picture'), 'photo', type],
      [jpeg.subarray(0, jpeg.length / 2), 'photo', /could not be read/],
      [jpeg, 'picture', 'must be one file in the field "photo" of a multipart/form-data body'],
      [null, 'photo', 'must be one file, sent as multipart/form-data'],
    ] as const) {
      const answer = await send(file, { field });
      const { error } = answer.body as { error: { fields: Record<string, string> } };
      expect([answer.status, Object.keys(error.fields)]).toEqual([400, ['photo']]);
      expect(error.fields.photo).toMatch(words);
    }
    const large = await send(Buffer.concat([jpeg, Buffer.alloc(mostPhotoBytes)]));
    expect([large.status, large.body]).toMatchObject([
      413,
      { error: { code: 'tooLarge', fields: { photo: 'must be 8 MB or smaller' } } },
    ]);
    expect(files()).toEqual([]);
  });

  it('belongs to one version; there are at most twelve, and none of a version not there', async () => {
    const { client, send, params } = await clover();
    const file = await plain(20, 20).jpeg().toBuffer();
    await client.must(addPetStyle, { params, body: { styleId: 'short-all-over' } });
    expect((await send(file, { version: 3 })).status).toBe(404);
    for (let i = 0; i < 12; i++) expect((await send(file, { version: 2 })).status).toBe(200);
    const more = await send(file, { version: 2 });
    expect((more.body as { error: { message: string } }).error.message).toContain('at most 12');
    expect((await send(file, { version: 1 })).status).toBe(200);
    const versions = await client.must(listPetStyles, { params });
    expect(versions.map(({ photos }) => photos.length)).toEqual([12, 1]);
  });

  it('goes with its file when it is removed', async () => {
    const { client, send, files } = await clover();
    const photo = (await send(await plain(20, 20).jpeg().toBuffer())).body as Photo;
    await client.must(removePhoto, { params: { photoId: photo.id } });
    await expect.poll(files).toEqual([]);
    expect((await client.call(getPhoto, { params: { photoId: photo.id } })).status).toBe(404);
  });

  it('may be of a pet from before versions were kept', async () => {
    const { client, send, params } = await clover();
    await inBusiness(client.session!.business.id, () => PetStyle.destroy({ where: {} }));
    expect((await send(await plain(20, 20).jpeg().toBuffer())).status).toBe(200);
    const [first] = await client.must(listPetStyles, { params });
    expect([first!.version, first!.photos.length]).toEqual([1, 1]);
  });
});

it('sweeps files no row knows after a day, and no others', async () => {
  const { client, send, files, folder } = await clover();
  const photo = (await send(await plain(20, 20).jpeg().toBuffer())).body as Photo;
  files();
  const now = new Date();
  const old = new Date(now.getTime() - 25 * 3_600_000);
  for (const name of ['orphan.jpg', 'broken-off.jpg.part', 'young.jpg'])
    writeFileSync(join(folder, name), 'x');
  for (const name of ['orphan.jpg', 'broken-off.jpg.part', `${photo.id}.jpg`])
    utimesSync(join(folder, name), old, old);
  expect(await sweepPhotos(now)).toBe(2);
  expect(files()).toEqual([`${photo.id}.jpg`, 'young.jpg'].sort());
  const rows = await inBusiness(client.session!.business.id, () => PhotoRow.count());
  expect(rows).toBe(1);
});
