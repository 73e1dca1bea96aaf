import { createHash } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import exifr from 'exifr';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { KEPT_PIXELS, LARGEST_FILE } from '@/domain/photos/photos';
import { app } from '@/server/context';
import { avifOf, bomb, grain, halves, heicHead, jpegOf, phonePhoto, pngOf, webpOf } from '../../factories/pictures';
import { call } from '../api/support/call';
import { useNetwork } from '../api/support/useNetwork';
import { picture, sendForm, statusOf, upload } from './support';

const { who } = useNetwork();
const bytesOf = async (id: string, size: 'full' | 'small' = 'full') =>
  Buffer.from(await (await picture(who('north.senior'), id, size)).arrayBuffer());
const filesIn = async (folder: string) =>
  readdir(join((await app()).config.dataDir, folder), { recursive: true }).catch(() => []);
const rows = async () => (await app()).db.read<{ id: string }>('SELECT id FROM attachments');

/** What was refused left nothing behind: no row, no file, no temporary file. */
async function expectNothingKept() {
  expect(await rows()).toEqual([]);
  expect(await filesIn('files')).toEqual([]);
  expect(await filesIn('uploads')).toEqual([]);
}

describe('an uploaded photo', () => {
  it.each([
    ['JPEG', jpegOf],
    ['PNG', pngOf],
    ['WebP', webpOf],
    ['AVIF', avifOf],
  ])('is taken as %s and kept as JPEG', async (_, make) => {
    const sent = await make();
    // Neither the name nor the declared type is believed.
    const answer = await upload(who('north.senior'), sent, { name: 'x.bin', type: 'application/pdf' });
    expect(answer.status).toBe(201);
    const { id, url, small, width, height, bytes } = answer.body;
    expect({ url, small }).toEqual({ url: `/photos/${id}`, small: `/photos/${id}/small` });
    expect(answer.headers.get('location')).toBe(`/photos/${id}`);
    const kept = await bytesOf(id);
    expect(kept.length).toBe(bytes);
    expect(await sharp(kept).metadata()).toMatchObject({ format: 'jpeg', width, height });
    const [row] = await (await app()).db.read<{ hash: string }>('SELECT hash FROM attachments');
    expect(row?.hash).toBe(createHash('sha256').update(kept).digest('hex'));
    expect((await filesIn('files')).sort()).toEqual(['photos', `photos/${id}-small.jpg`, `photos/${id}.jpg`]);
    expect(await filesIn('uploads')).toEqual([]);
  });

  it('loses all that the camera noted: place, maker, XMP and colour profile', async () => {
    const sent = await phonePhoto();
    const before = (await exifr.parse(sent, { gps: true, xmp: true, icc: true, iptc: true })) as Record<
      string,
      unknown
    >;
    expect(before).toMatchObject({
      Make: 'Halden',
      latitude: expect.closeTo(59.125, 3),
      longitude: expect.closeTo(11.383, 2),
    });
    expect(before).toHaveProperty('ProfileDescription');
    const { body } = await upload(who('north.senior'), sent);
    for (const size of ['full', 'small'] as const) {
      const kept = await bytesOf(body.id, size);
      expect(await exifr.parse(kept, true)).toBeUndefined();
      expect(await exifr.gps(kept).catch(() => undefined)).toBeUndefined();
      const { exif, icc, xmp, iptc, orientation } = await sharp(kept).metadata();
      expect({ exif, icc, xmp, iptc, orientation }).toEqual({});
      expect(kept.includes('Halden') || kept.includes('Northgate') || kept.includes('Exif')).toBe(false);
    }
  });

  it('stands upright', async () => {
    const { body } = await upload(who('north.senior'), await halves(6));
    expect(body).toMatchObject({ width: 100, height: 200 });
    // Turned a quarter clockwise, what was left is on top.
    const pixel = async (top: number) => {
      const { data } = await sharp(await bytesOf(body.id))
        .extract({ left: 50, top, width: 1, height: 1 })
        .raw()
        .toBuffer({ resolveWithObject: true });
      return [...data];
    };
    const [red, blue] = [await pixel(20), await pixel(180)];
    expect(red[0]! > 200 && red[2]! < 60, String(red)).toBe(true);
    expect(blue[2]! > 200 && blue[0]! < 60, String(blue)).toBe(true);
  });

  it('is scaled down to 12 megapixels, in proportion, with a small one of at most 480', async () => {
    const { body } = await upload(who('north.senior'), await grain(6000, 4000).jpeg({ quality: 40 }).toBuffer());
    expect(body.width * body.height).toBeLessThanOrEqual(KEPT_PIXELS);
    expect(body.width * body.height).toBeGreaterThan(KEPT_PIXELS * 0.99);
    expect(body.width / body.height).toBeCloseTo(1.5, 2);
    const { width, height } = await sharp(await bytesOf(body.id, 'small')).metadata();
    expect({ width, height }).toEqual({ width: 480, height: 320 });
  }, 30_000);

  it('is white where it was clear', async () => {
    const clear = await sharp({
      create: { width: 20, height: 20, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } },
    })
      .png()
      .toBuffer();
    const { body } = await upload(who('north.senior'), clear);
    const { dominant } = await sharp(await bytesOf(body.id)).stats();
    expect(Math.min(dominant.r, dominant.g, dominant.b)).toBeGreaterThan(240);
  });

  it('leaves behind what was hung on to it', async () => {
    const script = '<script>alert(document.domain)</script>';
    const zip = Buffer.concat([Buffer.from('PK\x03\x04'), Buffer.from(script)]);
    const comment = Buffer.concat([Buffer.from([0xff, 0xfe, 0, script.length + 2]), Buffer.from(script)]);
    const photo = await jpegOf();
    const withComment = Buffer.concat([photo.subarray(0, 2), comment, photo.subarray(2)]);
    for (const polyglot of [Buffer.concat([photo, zip]), withComment]) {
      const { status, body } = await upload(who('north.senior'), polyglot, { name: 'x.html', type: 'text/html' });
      expect(status).toBe(201);
      const answer = await picture(who('north.senior'), body.id);
      expect(Buffer.from(await answer.arrayBuffer()).includes('script')).toBe(false);
      expect(answer.headers.get('content-type')).toBe('image/jpeg');
      expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    }
  });
});

describe('what is refused', () => {
  const SVG = '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>alert(1)</script></svg>';
  it.each<[string, () => Buffer | string | Promise<Buffer>, number, RegExp]>([
    ['a text named .jpg', () => 'Wipe the joint once more.', 415, /no photo that can be read here/],
    ['an SVG', () => SVG, 415, /no photo that can be read here/],
    ['a GIF', () => Buffer.from('GIF89a\x01\0\x01\0\0\0\0;', 'latin1'), 415, /Send a JPEG, PNG, WebP or AVIF/],
    ['a PDF', () => '%PDF-1.7\n', 415, /no photo that can be read here/],
    ['a HEIC picture', heicHead, 415, /HEIC picture.*Most compatible/],
    ['an empty file', () => '', 422, /This file is empty/],
    [
      'a JPEG that is cut off',
      async () => (await grain(400, 300).jpeg().toBuffer()).subarray(0, 9000),
      422,
      /damaged or cut off/,
    ],
    [
      'a PNG that is cut off',
      async () => (await grain(400, 300).png().toBuffer()).subarray(0, 9000),
      422,
      /damaged or cut off/,
    ],
    ['the mere beginning of a JPEG', () => Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16]), 422, /damaged or cut off/],
    ['a picture of 900 megapixels', () => bomb(), 422, /900 megapixels; 64 are read at most/],
  ])('%s', async (_, make, status, words) => {
    const started = process.memoryUsage().rss;
    const answer = await upload(who('north.senior'), await make());
    expect(answer.status).toBe(status);
    expect(answer.body.errors[0]).toMatchObject({ path: 'photo', message: expect.stringMatching(words) });
    expect(process.memoryUsage().rss - started).toBeLessThan(300 * 1024 * 1024);
    await expectNothingKept();
  });

  it('a file of more than 15 MB, however it is sent, read no further than that', async () => {
    let taken = 0;
    const boundary = 'b0undary';
    const head = `--${boundary}\r\nContent-Disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\n`;
    const endless = new ReadableStream({
      pull(to) {
        to.enqueue(taken === 0 ? Buffer.from(head) : Buffer.alloc(64 * 1024, 0xff));
        taken += 64 * 1024;
        if (taken > 20 * 1024 * 1024) to.close();
      },
    });
    const answer = await call(who('north.senior'), 'POST', '/photos', {
      raw: endless,
      headers: { 'content-type': `multipart/form-data; boundary=${boundary}` },
    });
    expect(answer).toMatchObject({ status: 413, body: { detail: expect.stringContaining('15 MB at most') } });
    expect(answer.headers.get('connection')).toBe('close');
    expect(taken).toBeLessThan(LARGEST_FILE + 2 * 1024 * 1024);
    const declared = await upload(who('north.senior'), await jpegOf(), {
      headers: { 'content-length': String(20 * 1024 * 1024) },
    });
    expect(declared.status).toBe(413);
    await expectNothingKept();
  });

  it('what is no form with one photo', async () => {
    const senior = who('north.senior');
    const json = await call(senior, 'POST', '/photos', { body: { photo: 'x' } });
    expect(json).toMatchObject({ status: 415 });
    const bare = await call(senior, 'POST', '/photos', {
      raw: 'x',
      headers: { 'content-type': 'multipart/form-data; a=b' },
    });
    expect(bare.status).toBe(400);
    const cut = await call(senior, 'POST', '/photos', {
      raw: '--b\r\nContent-Disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\nabc',
      headers: { 'content-type': 'multipart/form-data; boundary=b' },
    });
    expect(cut.status).toBe(400);
    const none = new FormData();
    none.append('alt', 'Nothing');
    expect(await sendForm(senior, '/photos', none)).toMatchObject({ status: 422, body: { detail: 'Choose a photo.' } });
    const two = new FormData();
    for (const name of ['a.jpg', 'b.jpg']) two.append('photo', new Blob([new Uint8Array(await jpegOf())]), name);
    expect((await sendForm(senior, '/photos', two)).status).toBe(413);
    const long = new FormData();
    long.append('alt', 'x'.repeat(201));
    long.append('photo', new Blob([new Uint8Array(await jpegOf())]), 'a.jpg');
    expect((await sendForm(senior, '/photos', long)).body.errors).toEqual([
      { path: 'alt', message: 'must be 200 characters or fewer' },
    ]);
    await expectNothingKept();
  });

  it('whoever is nobody, or of no shop, or comes from another site', async () => {
    const photo = await jpegOf();
    expect((await upload(null, photo)).status).toBe(401);
    expect((await upload(who('nobody'), photo)).status).toBe(403);
    expect((await upload(who('north.senior'), photo, { headers: { origin: 'https://evil.example' } })).status).toBe(
      403,
    );
    await expectNothingKept();
  });

  it('the sixty-first within a minute', async () => {
    const statuses = await Promise.all(
      Array.from({ length: 61 }, () =>
        call(who('pier.owner'), 'POST', '/photos', { raw: 'x', headers: { 'content-type': 'multipart/form-data' } }),
      ),
    );
    expect(statuses.filter(({ status }) => status === 429)).toHaveLength(1);
  });

  it('one more than 40 that were never sent', async () => {
    const { db } = await app();
    const senior = who('north.senior');
    for (let i = 0; i < 40; i++)
      await db.models.Attachment.create({
        uploaderId: senior.id,
        width: 1,
        height: 1,
        bytes: 1,
        hash: '0'.repeat(64),
        at: new Date().toISOString(),
      });
    expect(await upload(senior, await jpegOf())).toMatchObject({
      status: 409,
      body: { detail: expect.stringContaining('40 photos') },
    });
    expect((await upload(who('north.owner'), await jpegOf())).status).toBe(201);
  });
});

describe('a repeated Idempotency-Key', () => {
  it('keeps one photo, and refuses another photo under the same key', async () => {
    const senior = who('north.senior');
    const photo = await jpegOf();
    const headers = { 'idempotency-key': 'once' };
    const [one, two] = [await upload(senior, photo, { headers }), await upload(senior, photo, { headers })];
    expect(two.body).toEqual(one.body);
    expect(two.headers.get('idempotency-replayed')).toBe('true');
    expect(await rows()).toHaveLength(1);
    expect((await upload(senior, await pngOf(), { headers })).status).toBe(422);
  });
});

describe('an unsent photo', () => {
  it('is seen by nobody but its uploader, and taken off without a trace', async () => {
    const { body } = await upload(who('north.senior'), await jpegOf());
    for (const name of ['north.editor', 'common.editor', 'steward', 'pier.senior'])
      expect(await statusOf(picture(who(name), body.id)), name).toBe(404);
    expect((await call(who('north.editor'), 'DELETE', `/photos/${body.id}`)).status).toBe(404);
    expect((await call(who('north.senior'), 'DELETE', `/photos/${body.id}`)).status).toBe(204);
    expect(await statusOf(picture(who('north.senior'), body.id))).toBe(404);
    expect((await call(who('north.senior'), 'DELETE', `/photos/${body.id}`)).status).toBe(404);
    expect(await rows()).toEqual([]);
    expect(await filesIn('files')).toEqual(['photos']);
  });
});
