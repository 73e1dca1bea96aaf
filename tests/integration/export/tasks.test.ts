import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { APIContext } from 'astro';
import { XmlElement } from 'libxml2-wasm';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { GET } from '@/pages/procedures/[number]/task.dita';
import { withdraw } from '@/server/bulletins/withdraw';
import { writeTasks } from '@/server/export/tasks';
import { publish } from '@/server/review/publish';
import { validTask } from '../../factories/dita';
import { publishFirst, signedIn, type Member } from '../api/support/network';
import { agreed, waiting } from '../api/support/review';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who, shop } = useNetwork();
let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'matchmark-dita-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const actorOf = async (person: Member) => (await signedIn(person)).actor;
async function download(person: Member, number: string): Promise<Response> {
  const url = new URL(`http://book.test/procedures/${number}/task.dita`);
  return GET({ params: { number }, url, locals: { actor: await actorOf(person) } } as unknown as APIContext);
}
const values = (xml: string, path: string, name: string) =>
  validTask(xml)
    .find(path)
    .flatMap((node) => (node instanceof XmlElement ? (node.attr(name)?.content ?? []) : []));

describe('the sheet as a download', () => {
  test('is a valid task, kept as a file, with who reviewed it and the address of its links', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142', { nm: 12, extra: '' });
    await agreed([who('common.editor')], id);
    await publish(await actorOf(who('common.editor2')), id);
    const response = await download(who('pier.apprentice'), 'P-0142');
    expect(response.headers.get('content-disposition')).toBe(
      'attachment; filename="p-0142-reseal-the-test-cover.dita"',
    );
    expect(response.headers.get('content-type')).toBe('application/dita+xml; charset=utf-8');
    const xml = await response.text();
    expect(values(xml, '//othermeta[@name="revision"]', 'content')).toEqual(['B']);
    expect(values(xml, '//othermeta[@name="standing"]', 'content')).toEqual(['current']);
    expect(values(xml, '//created', 'date')).toEqual(['2026-01-02']);
    expect(xml).toContain('<author type="contributor">common.editor2</author>');
  });

  test('says that a sheet is withdrawn', async () => {
    await withdraw(await actorOf(who('common.editor')), 'P-0142', 'Doubtful');
    const xml = await (await download(who('pier.apprentice'), 'P-0142')).text();
    expect(values(xml, '//othermeta[@name="standing"]', 'content')).toEqual(['withdrawn']);
    expect(xml).toContain('do not work from this sheet');
  });

  test('is for who may read the sheet, and for others there is none', async () => {
    await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north' }) });
    expect((await download(who('north.apprentice'), 'P-0901')).status).toBe(200);
    for (const person of ['pier.owner', 'common.editor', 'steward', 'nobody'])
      await expect(download(who(person), 'P-0901')).rejects.toMatchObject({ status: 404 });
    await expect(download(who('nobody'), 'P-0142')).rejects.toMatchObject({ status: 404 });
    await expect(download(who('north.owner'), 'P-0999')).rejects.toMatchObject({ status: 404 });
  });
});

describe('a book as a folder of tasks', () => {
  const linked = text({
    title: 'Links and draws',
    extra: `
<Step id="more" title="More">
See [P-0142](/procedures/P-0142) and [P-0777](/procedures/P-0777).

<Figure of="drawing" />
</Step>
`,
  }).replace(
    'sources:',
    'figures:\n  - key: drawing\n    file: drawing.svg\n    alt: A drawing\n    caption: What it shows\nsources:',
  );

  test('each sheet in use is a file, its drawings lie beside it, links lead from file to file', async () => {
    await publishFirst('P-0200', { source: linked });
    await publishFirst('P-0300', { source: text({ title: 'Gone' }) });
    await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north' }) });
    await withdraw(await actorOf(who('common.editor')), 'P-0300', 'Doubtful');
    const drawings = mkdtempSync(join(tmpdir(), 'matchmark-drawings-'));
    writeFileSync(join(drawings, 'drawing.svg'), '<svg/>');
    const names = ['p-0142-reseal-the-test-cover.dita', 'p-0200-links-and-draws.dita'];
    expect(await writeTasks(folder, null, drawings)).toEqual(names);
    expect(readdirSync(folder).sort()).toEqual(['figures', ...names]);
    expect(readdirSync(join(folder, 'figures'))).toEqual(['drawing.svg']);
    const xml = readFileSync(join(folder, names[1]!), 'utf8');
    expect(values(xml, '//image', 'href')).toEqual(['figures/drawing.svg']);
    expect(values(xml, '//xref[@scope="local"]', 'href')).toEqual([names[0]]);
    expect(values(xml, '//xref[@scope="external"]', 'href')).toEqual(['/procedures/P-0777']);
    rmSync(drawings, { recursive: true });
  });

  test('a shop gets its own alone; an empty book says so', async () => {
    await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north' }) });
    expect(await writeTasks(folder, shop('north'))).toEqual(['p-0901-only-north.dita']);
    await expect(writeTasks(folder, shop('pier'))).rejects.toThrow('Nothing in this book is in use');
  });
});
