import { createHash, randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import S3rver from 's3rver';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { app } from '@/server/context';
import { deleteFiles, putFile, readFile } from '@/server/files/store';
import { sweepPhotos } from '@/server/photos/sweep';
import { openTestBook } from '../../setup/database';
import { grain, jpegOf } from '../../factories/pictures';
import { call } from '../api/support/call';
import { makeNetwork, publishFirst, type Network } from '../api/support/network';
import { waiting } from '../api/support/review';
import { picture, statusOf, upload } from './support';

const directory = mkdtempSync(join(tmpdir(), 'matchmark-s3-'));
/** A service that speaks S3 (s3rver 3.7.1), on a port of its own. */
const fake = new S3rver({
  port: 0,
  address: '127.0.0.1',
  silent: true,
  directory,
  configureBuckets: [{ name: 'photos', configs: [] }],
});
let endpoint = '';
beforeAll(async () => {
  const { port } = await fake.run();
  endpoint = `http://127.0.0.1:${port}`;
});
afterAll(async () => {
  await fake.close().catch(() => undefined);
  rmSync(directory, { recursive: true, force: true });
});

const bucket = (at = endpoint) => ({
  name: 'photos',
  endpoint: at,
  region: 'us-east-1',
  keys: { id: 'S3RVER', secret: 'S3RVER' },
  pathStyle: true,
});
const sha = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
/** A fault of storage is ours, and logged; the test that provokes it says how often. */
const quiet = () => vi.spyOn(console, 'error').mockImplementation(() => undefined);

describe.each(['the data folder', 'a bucket'])('%s', (where) => {
  const open = () => openTestBook(where === 'a bucket' ? { bucket: bucket() } : {});

  it('gives back byte for byte what was put in, and forgets what was deleted', async () => {
    await open();
    for (const size of [1, 70_000, 3_000_001]) {
      const bytes = new Uint8Array(await grain(8, 8).raw().toBuffer()).slice(0, 1);
      const whole = Buffer.alloc(size, bytes);
      for (let i = 0; i < size; i += 997) whole[i] = i % 251;
      const key = `photos/${randomUUID()}.jpg`;
      await putFile(key, whole, 'image/jpeg');
      expect(sha(await readFile(key))).toBe(sha(whole));
      await deleteFiles([key, key]);
      await expect(readFile(key)).rejects.toMatchObject({ status: 503 });
    }
  });

  it('holds the photos of a thread from upload to removal', async () => {
    await open();
    const { people } = await makeNetwork();
    await publishFirst('P-0142');
    const { id } = await waiting(people['north.senior']!, 'P-0142');
    const editor = people['common.editor']!;
    const { body } = await upload(editor, await grain(900, 600).jpeg().toBuffer());
    const kept = new Uint8Array(await (await picture(editor, body.id)).arrayBuffer());
    const [row] = await (await app()).db.read<{ hash: string }>('SELECT hash FROM attachments');
    expect(sha(kept)).toBe(row!.hash);
    await call(editor, 'POST', `/proposals/${id}/threads`, {
      body: { kind: 'remark', text: 'See.', photos: [body.id] },
    });
    expect(await statusOf(picture(people['pier.apprentice']!, body.id, 'small'))).toBe(200);
    expect((await call(editor, 'POST', `/photos/${body.id}/remove`, { body: { reason: 'Wrong one.' } })).status).toBe(
      200,
    );
    await expect(readFile(`photos/${body.id}.jpg`)).rejects.toMatchObject({ status: 503 });
  });
});

describe('a store that fails', () => {
  /** The network, a proposal and a photo in a store that then goes away. */
  async function withPhoto(config: Parameters<typeof openTestBook>[0], fail: () => void | Promise<void>) {
    const running = await openTestBook(config);
    const network: Network = await makeNetwork();
    await publishFirst('P-0142');
    const { id } = await waiting(network.people['north.senior']!, 'P-0142');
    const editor = network.people['common.editor']!;
    const { body } = await upload(editor, await jpegOf());
    await fail();
    return { running, editor, proposal: id, photo: body.id as string };
  }

  async function expectClearRefusals({ editor, proposal, photo }: Awaited<ReturnType<typeof withPhoto>>) {
    const log = quiet();
    const warned = vi.spyOn(console, 'warn').mockImplementation(() => undefined);
    const { db } = await app();
    const before = await db.read('SELECT * FROM attachments');
    const refused = await upload(editor, await jpegOf());
    expect(refused).toMatchObject({
      status: 503,
      body: { type: '/problems/photo-storage', detail: expect.stringContaining('What you typed is kept') },
    });
    expect(refused.headers.get('retry-after')).toBe('30');
    expect(await db.read('SELECT * FROM attachments')).toEqual(before);
    // The words can still be sent, also with a photo that is there already; the picture itself cannot be had meanwhile.
    const sent = await call(editor, 'POST', `/proposals/${proposal}/threads`, {
      body: { kind: 'remark', text: 'See.', photos: [photo] },
    });
    expect(sent.status).toBe(201);
    expect(await statusOf(picture(editor, photo))).toBe(503);
    // Nothing counts as removed while its picture still lies somewhere.
    expect((await call(editor, 'POST', `/photos/${photo}/remove`, { body: { reason: 'Wrong one.' } })).status).toBe(
      503,
    );
    const { body } = await call(editor, 'GET', `/proposals/${proposal}/threads`);
    expect(body.items[0].messages[0].photos[0].removed).toBeNull();
    expect(log).toHaveBeenCalledTimes(2);
    await expect(sweepPhotos()).resolves.toBe(0);
    expect(warned).not.toHaveBeenCalled();
    log.mockRestore();
    warned.mockRestore();
  }

  it('refuses with 503 where the bucket cannot be reached, and nothing is half kept', async () => {
    // A second service, so that it can be switched off.
    const other = new S3rver({
      port: 0,
      address: '127.0.0.1',
      silent: true,
      directory: mkdtempSync(join(directory, 'off-')),
      configureBuckets: [{ name: 'photos', configs: [] }],
    });
    const { port } = await other.run();
    const scene = await withPhoto({ bucket: bucket(`http://127.0.0.1:${port}`) }, () => other.close());
    await expectClearRefusals(scene);
  });

  it('refuses with 503 where the folder cannot be written, read or emptied', async () => {
    const scene = await withPhoto({}, async () => {
      const { config } = await app();
      // A file where the folder was: nothing under it can be read, written or deleted, by root neither.
      rmSync(join(config.dataDir, 'files'), { recursive: true });
      writeFileSync(join(config.dataDir, 'files'), '');
    });
    await expectClearRefusals(scene);
  });

  it('refuses with 503 where the upload itself finds no room', async () => {
    const { config } = await openTestBook();
    const { people } = await makeNetwork();
    writeFileSync(join(config.dataDir, 'uploads'), '');
    const log = quiet();
    expect(await upload(people['common.editor']!, await jpegOf())).toMatchObject({
      status: 503,
      body: { type: '/problems/photo-storage' },
    });
    expect(log).toHaveBeenCalledTimes(1);
    log.mockRestore();
  });
});
