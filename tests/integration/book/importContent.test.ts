import { mkdir, readFile, readdir, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { beforeEach, describe, expect, test } from 'vitest';
import type { App } from '@/server/context';
import { fileName } from '@/domain/export/slug';
import { exportBook } from '@/server/book/exportBook';
import { importContent } from '@/server/book/importContent';
import { hashOf, parsedText } from '@/server/book/parsed';
import { readSheet } from '@/server/book/sheet';
import { agree } from '@/server/review/agree';
import { overrideClamp } from '@/server/review/override';
import { publish } from '@/server/review/publish';
import { readProposal } from '@/server/review/readProposal';
import { checkBook } from '@/server/audit/check';
import { readDesk } from '@/server/review/readDesk';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { makeNetwork, signedIn, type Network } from '../api/support/network';
import { text } from '../api/support/text';
import { openTestBook } from '../../setup/database';

const FILE = 'p-0007-test-cover.mdx';
let running: App;
let network: Network;
let folder: string;

const ship = (source: string, name = FILE) => writeFile(join(folder, name), source);
const actor = async (name: string) => (await signedIn(network.people[name]!)).actor;
const current = async (number = 'P-0007') => readSheet(await actor('north.apprentice'), number);
const nothing = { added: [], revised: [], proposed: [], problems: [] };

/** The book's own revision, by its people. */
async function bookRevision(source: string) {
  const sheet = await current();
  const draft = await startProposal(await actor('north.senior'), 'P-0007', {
    base: sheet.revision.letter,
    source,
    reason: 'Learned at the bench.',
  });
  await submit(await actor('north.senior'), draft.id);
  await agree(await actor('common.editor'), draft.id);
  await publish(await actor('common.editor2'), draft.id);
}

beforeEach(async () => {
  running = await openTestBook();
  network = await makeNetwork();
  folder = join(running.config.contentDir, 'procedures');
  await mkdir(folder, { recursive: true });
});

describe('importContent', () => {
  test('a new file becomes revision A of the common book, in canonical form, found by search', async () => {
    await ship(text());
    expect(await importContent()).toEqual({ ...nothing, added: ['P-0007'] });
    const sheet = await current();
    expect(sheet.revision).toMatchObject({
      letter: 'A',
      state: 'published',
      reason: 'First issue of the common book.',
    });
    expect(sheet.revision.author.name).toBe('Matchmark release');
    const parsed = await parsedText(text());
    expect(parsed.ok && parsed.canonical).toBe(sheet.source);
    expect(sheet.revision.hash).toBe(hashOf(sheet.source));
    expect(await running.db.read("SELECT * FROM searchWords WHERE searchWords MATCH 'clean'")).toHaveLength(1);
  });

  test('done again, or with the same words laid out otherwise, it changes nothing', async () => {
    await ship(text());
    await importContent();
    const before = await running.db.read('SELECT * FROM revisions');
    expect(await importContent()).toEqual(nothing);
    await ship(text().replace('engines:\n  - tarn-t18f', 'engines: [tarn-t18f]'));
    expect(await importContent()).toEqual(nothing);
    expect(await running.db.read('SELECT * FROM revisions')).toEqual(before);
  });

  test('a file that a later release changed becomes the next revision where the book stood still', async () => {
    await ship(text());
    await importContent();
    await ship(text({ nm: 12 }));
    expect(await importContent()).toEqual({ ...nothing, revised: ['P-0007'] });
    const { revision, frontmatter, earlier } = await current();
    expect(revision.letter).toBe('B');
    expect(frontmatter.torques[0]?.nm).toBe(12);
    expect(earlier).toBe(1);
    expect((await readSheet(await actor('north.apprentice'), 'P-0007', 'A')).revision.state).toBe('superseded');
  });

  test('it becomes a proposal where the book has changes of its own, which stay', async () => {
    await ship(text());
    await importContent();
    await bookRevision(text({ word: 'dry' }));
    await ship(text({ nm: 12 }));
    expect(await importContent()).toEqual({ ...nothing, proposed: ['P-0007'] });
    expect((await current()).source).toContain('a dry cloth');

    const [waiting] = await readDesk(await actor('common.editor'));
    expect(waiting).toMatchObject({ number: 'P-0007', base: 'B', agreementsNeeded: 2, stale: false });
    expect(waiting?.author.name).toBe('Matchmark release');
  });

  test('that proposal is reviewed like any other, and a further release renews it', async () => {
    await ship(text());
    await importContent();
    await bookRevision(text({ word: 'dry' }));
    await ship(text({ nm: 12 }));
    await importContent();
    const [first] = await readDesk(await actor('common.editor'));
    await agree(await actor('common.editor'), first!.id);
    const { version } = await readProposal(await actor('common.editor'), first!.id);

    await ship(text({ nm: 13 }));
    expect(await importContent()).toEqual({ ...nothing, proposed: ['P-0007'] });
    const desk = await readDesk(await actor('common.editor'));
    expect(desk).toHaveLength(1);
    expect(desk[0]).toMatchObject({ id: first!.id, agreements: 0 });
    expect((await readProposal(await actor('common.editor'), first!.id)).version).toBe(version + 1);

    await agree(await actor('common.editor'), first!.id);
    await publish(await actor('common.editor2'), first!.id);
    expect((await current()).revision.letter).toBe('C');
    // An editor published what a release wrote: the trail says so, and nothing of it is a fault.
    const { faults } = await checkBook();
    expect(faults.filter(({ id }) => id === first!.id)).toEqual([]);
    expect((await current()).frontmatter.torques[0]?.nm).toBe(13);
  });

  test('a torque past proof load never comes in unreviewed: a new file is left out and told each time, a changed one waits', async () => {
    await ship(text({ nm: 20 }));
    const problems = [
      {
        file: FILE,
        message:
          'It would clamp Cover bolt to 143 % of proof load. What a release adds nobody reviews, so nobody could override the clamp check.',
      },
    ];
    expect(await importContent()).toEqual({ ...nothing, problems });
    expect(await importContent()).toEqual({ ...nothing, problems });
    await ship(text());
    expect(await importContent()).toEqual({ ...nothing, added: ['P-0007'] });

    await ship(text({ nm: 20 }));
    expect(await importContent()).toEqual({ ...nothing, proposed: ['P-0007'] });
    expect((await current()).frontmatter.torques[0]?.nm).toBe(10);
    const editor = await actor('common.editor');
    const [waiting] = await readDesk(editor);
    expect(waiting).toMatchObject({ number: 'P-0007', base: 'A' });
    await agree(await actor('common.editor2'), waiting!.id);
    await expect(publish(editor, waiting!.id)).rejects.toMatchObject({ status: 409 });
    await overrideClamp(editor, waiting!.id, { torque: 'cover-bolt', reason: 'Stretch measured.' });
    await publish(editor, waiting!.id);
    expect((await current()).revision).toMatchObject({ letter: 'B', overrides: [{ reason: 'Stretch measured.' }] });
    expect(await importContent()).toEqual(nothing);
  });

  test('a file that cannot be read is left out and told, and taken once it is mended', async () => {
    await ship(text().replace('<Torque of="cover-bolt" />', '<Torque of="head-bolt" />'));
    await ship(text({ title: 'Good one' }), 'p-0008-good.mdx');
    const { added, problems } = await importContent();
    expect(added).toEqual(['P-0008']);
    expect(problems).toEqual([{ file: FILE, message: expect.stringMatching(/^Line \d+, column \d+: .*head-bolt/) }]);
    await ship(text());
    expect(await importContent()).toEqual({ ...nothing, added: ['P-0007'] });
  });

  test("a shop's own procedure is not touched by a file of the same number", async () => {
    const { Procedure } = running.db.models;
    await Procedure.create({ number: 'P-0007', bookKind: 'shop', shopId: network.north });
    await ship(text());
    const { problems } = await importContent();
    expect(problems).toEqual([{ file: FILE, message: "P-0007 is taken by a shop's own procedure." }]);
  });
});

describe('exportBook', () => {
  const files = async () =>
    Promise.all((await readdir(folder)).sort().map(async (name) => [name, await readFile(join(folder, name), 'utf8')]));

  test('writes the published text, and the second time not a byte changes', async () => {
    await ship(text());
    await importContent();
    await bookRevision(text({ word: 'dry' }));
    const { source } = await current();
    expect(await exportBook(running.config.contentDir)).toEqual({ written: [FILE], unchanged: [] });
    const written = await files();
    expect(written).toEqual([[FILE, source]]);
    expect(await exportBook(running.config.contentDir)).toEqual({ written: [], unchanged: [FILE] });
    expect(await files()).toEqual(written);
    // And what was written comes in as what it is: nothing new.
    expect(await importContent()).toEqual(nothing);
  });

  test('names a file after its title where it has none, and leaves shop books at home', async () => {
    await ship(text());
    await importContent();
    await rm(join(folder, FILE));
    await running.db.models.Procedure.create({ number: 'P-0099', bookKind: 'shop', shopId: network.north });
    expect(await exportBook(running.config.contentDir)).toEqual({
      written: ['p-0007-reseal-the-test-cover.mdx'],
      unchanged: [],
    });
  });

  test.each([
    ['Valve cover: reseal (T18F)', 'p-0200-valve-cover-reseal-t18f.mdx'],
    ['Größe prüfen — ½ Umdrehung', 'p-0200-grosse-prufen-1-2-umdrehung.mdx'],
    ['弁', 'p-0200-procedure.mdx'],
  ])('%s', (title, name) => expect(fileName('P-0200', title)).toBe(name));
});
