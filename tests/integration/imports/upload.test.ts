import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeEach, expect, it } from 'vitest';
import { app } from '@/server/context';
import { OverLimit, readUpload } from '@/server/http/upload';
import { openTestBook } from '../../setup/database';

beforeEach(async () => void (await openTestBook()));

/** What lies in the folder for files that are looked at. */
async function kept(): Promise<string[]> {
  const folder = join((await app()).config.dataDir, 'uploads');
  return existsSync(folder) ? readdirSync(folder) : [];
}

function sent(fields: Record<string, string | File>): Request {
  const body = new FormData();
  for (const [name, value] of Object.entries(fields)) body.set(name, value);
  return new Request('http://book.test/', { method: 'POST', body });
}
const file = (bytes: number, name = 'a.docx') => new File([new Uint8Array(bytes).fill(65)], name);

it('streams the file to the disk, gives the fields, and takes the file away again', async () => {
  const upload = await readUpload(
    sent({ book: 'common', text: 'a\r\nb', file: file(5000, 'Züge.docx') }),
    'file',
    10_000,
  );
  expect(upload.fields).toEqual({ book: 'common', text: 'a\nb' });
  expect(upload.file).toMatchObject({ name: 'Züge.docx', bytes: 5000 });
  expect(readFileSync(upload.file!.path, 'utf8')).toBe('A'.repeat(5000));
  await upload.discard();
  expect(await kept()).toEqual([]);
});

it('takes a form without a file, or with one under another name', async () => {
  const forms: Record<string, string | File>[] = [
    { a: '1' },
    { a: '1', file: new File([], '') },
    { a: '1', other: file(10) },
  ];
  for (const fields of forms) {
    const upload = await readUpload(sent(fields), 'file', 100);
    expect([upload.fields['a'], upload.file]).toEqual(['1', null]);
    await upload.discard();
  }
});

it('refuses a larger file with its fields, those behind it too, and leaves nothing on the disk', async () => {
  const refused = await readUpload(sent({ a: '1', file: file(200_000), b: '2' }), 'file', 100_000).catch(
    (e: unknown) => e,
  );
  expect(refused).toBeInstanceOf(OverLimit);
  expect(refused).toMatchObject({ status: 413, fields: { a: '1', b: '2' } });
  await expect(readUpload(sent({ a: 'x'.repeat(300_000) }), 'file', 100)).rejects.toMatchObject({ status: 413 });
  const many = Object.fromEntries(Array.from({ length: 60 }, (_, i) => [`f${i}`, 'x']));
  await expect(readUpload(sent(many), 'file', 100)).rejects.toMatchObject({ status: 413 });
  expect(await kept()).toEqual([]);
});

it('stops reading a form that never ends', async () => {
  const head = '--b\r\ncontent-disposition: form-data; name="file"; filename="a"\r\n\r\n';
  let asked = 0;
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      controller.enqueue(new TextEncoder().encode(asked === 0 ? head : 'x'.repeat(10_000)));
      asked += 1;
    },
  });
  const headers = { 'content-type': 'multipart/form-data; boundary=b' };
  const request = new Request('http://book.test/', { method: 'POST', headers, body, duplex: 'half' } as RequestInit);
  await expect(readUpload(request, 'file', 50_000)).rejects.toMatchObject({ status: 413 });
  expect(asked).toBeLessThan(100);
  expect(await kept()).toEqual([]);
});

it('refuses what is no form, or breaks off', async () => {
  const of = (type: string, body: string) =>
    new Request('http://book.test/', { method: 'POST', headers: { 'content-type': type }, body });
  const broken = '--b\r\ncontent-disposition: form-data; name="file"; filename="a"\r\n\r\nhalf';
  for (const [request, status] of [
    [of('multipart/form-data', 'x'), 415],
    [of('text/plain', 'x'), 415],
    [of('multipart/form-data; x=1', 'x'), 400],
    [of('multipart/form-data; boundary=b', broken), 400],
  ] as const)
    await expect(readUpload(request, 'file', 100)).rejects.toMatchObject({ status });
  expect(await kept()).toEqual([]);
});
