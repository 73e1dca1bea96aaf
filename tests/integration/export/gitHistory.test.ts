import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { bringBack, withdraw } from '@/server/bulletins/withdraw';
import { atTime } from '@/server/clock';
import { app } from '@/server/context';
import { git as runGit } from '@/server/export/git';
import { writeHistory } from '@/server/export/gitRepository';
import { shopBySlug } from '@/server/export/shops';
import { agree } from '@/server/review/agree';
import { publish } from '@/server/review/publish';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { addPerson, publishFirst, signedIn, type Member } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

/** Held against the git of this machine: what it reads out of the repository is what the book holds. */

const { who, shop } = useNetwork();
let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'matchmark-git-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const git = (...args: string[]): string =>
  execFileSync('git', ['-C', folder, ...args], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] });
const gitBytes = (...args: string[]): Buffer => execFileSync('git', ['-C', folder, ...args]);
const log = (format: string, ...args: string[]) =>
  git('log', '--reverse', `--format=${format}`, ...args)
    .trimEnd()
    .split('\n');
const actorOf = async (person: Member) => (await signedIn(person)).actor;

interface Change {
  base: string;
  source: string;
  reason: string;
  author?: Member;
}

/** Sends a change in on one day and publishes it on the next. */
async function publishChange(number: string, day: string, { base, source, reason, author }: Change): Promise<void> {
  const writer = await actorOf(author ?? who('north.senior'));
  const editors = await Promise.all(['common.editor', 'common.editor2'].map((name) => actorOf(who(name))));
  const { id } = await atTime(`2026-${day}T10:00:00.000Z`, async () => {
    const draft = await startProposal(writer, number, { base, source, reason });
    return submit(writer, draft.id);
  });
  await atTime(`2026-${day}T12:00:00.000Z`, async () => {
    await agree(editors[0]!, id);
    await publish(editors[1]!, id);
  });
}

async function aHistory(): Promise<void> {
  const odd = await addPerson('Søren <Øst> "Q" Ærø', [{ in: { shop: shop('north') }, role: 'senior' }]);
  const editor = await actorOf(who('common.editor'));
  await publishFirst('P-0101', { source: text({ title: 'Größe prüfen, ½ Umdrehung' }) });
  await publishChange('P-0142', '02-01', {
    base: 'A',
    source: text({ nm: 12 }),
    reason: 'It slipped\n\nReviewed-by: Nobody\n\nReally: it did',
  });
  await publishChange('P-0142', '02-03', {
    base: 'B',
    source: text({ nm: 12, word: 'lint-free, 10 µm, ⌀ 8,', title: 'Reseal another cover' }),
    reason: 'Ünïcode 🔧, <tags> & "quotes"\r\nSecond line\tand a tab',
    author: odd,
  });
  await atTime('2026-02-05T00:00:00.000Z', () => withdraw(editor, 'P-0142', 'The torque is doubtful'));
  await atTime('2026-02-06T00:00:00.000Z', () => bringBack(editor, 'P-0142', 'It was checked'));
  await atTime('2026-02-07T00:00:00.000Z', () => withdraw(editor, 'P-0101', 'Nobody needs it'));
}

const SEAL = 'content/procedures/p-0142-reseal-the-test-cover.mdx';

describe('the common book as a repository', () => {
  beforeEach(aHistory);

  test('git finds nothing wrong with it', async () => {
    await writeHistory(folder);
    const { code, out, err } = await runGit(['fsck', '--strict', '--no-dangling'], { cwd: folder });
    expect({ code, out, err }).toEqual({ code: 0, out: '', err: '' });
    expect(git('status', '--porcelain')).toBe('');
  });

  test('each stored revision stands under its tag, byte for byte', async () => {
    await writeHistory(folder);
    const { db } = await app();
    const revisions = await db.read<{ number: string; letter: string; source: string; hash: string }>(
      `SELECT p.number, r.letter, r.source, r.hash FROM revisions r JOIN procedures p ON p.id = r.procedureId WHERE r.letter IS NOT NULL`,
    );
    expect(git('tag').trim().split('\n').sort()).toEqual(
      revisions.map(({ number, letter }) => `${number}/${letter}`).sort(),
    );
    const paths = { 'P-0142': SEAL, 'P-0101': 'content/procedures/p-0101-grosse-prufen-1-2-umdrehung.mdx' };
    for (const { number, letter, source, hash } of revisions) {
      const path = paths[number as keyof typeof paths];
      expect(gitBytes('show', `${number}/${letter}:${path}`).equals(Buffer.from(source, 'utf8')), letter).toBe(true);
      expect(git('log', '-1', '--format=%(trailers:key=Sheet-check,valueonly)', `${number}/${letter}`).trim()).toBe(
        hash.slice(0, 8),
      );
    }
  });

  test('authors, publishers, dates and trailers are those of the book', async () => {
    await writeHistory(folder);
    expect(log('%s|%an|%cn|%ae|%aI|%cI')).toEqual([
      'P-0101 A, Größe prüfen, ½ Umdrehung|Release|Release|release-2@book.invalid|2026-01-02T03:04:05+00:00|2026-01-02T03:04:05+00:00',
      'P-0142 A, Reseal the test cover|Release|Release|release@book.invalid|2026-01-02T03:04:05+00:00|2026-01-02T03:04:05+00:00',
      'P-0142 B, Reseal the test cover|north senior|common.editor2|north-senior@book.invalid|2026-02-01T10:00:00+00:00|2026-02-01T12:00:00+00:00',
      'P-0142 C, Reseal another cover|Søren ‹Øst› "Q" Ærø|common.editor2|soren-ost-q-aero@book.invalid|2026-02-03T10:00:00+00:00|2026-02-03T12:00:00+00:00',
      'P-0142 C, Reseal another cover: withdrawn|common.editor|common.editor|common-editor@book.invalid|2026-02-05T00:00:00+00:00|2026-02-05T00:00:00+00:00',
      'P-0142 C, Reseal another cover: brought back|common.editor|common.editor|common-editor@book.invalid|2026-02-06T00:00:00+00:00|2026-02-06T00:00:00+00:00',
      'P-0101 A, Größe prüfen, ½ Umdrehung: withdrawn|common.editor|common.editor|common-editor@book.invalid|2026-02-07T00:00:00+00:00|2026-02-07T00:00:00+00:00',
    ]);
    const { db } = await app();
    const [{ told } = { told: -1 }] = await db.read<{ told: number }>(
      `SELECT (SELECT count(*) FROM revisions WHERE letter IS NOT NULL)
         + (SELECT count(*) FROM bulletins WHERE kind <> 'critical change') AS told`,
    );
    expect(git('rev-list', '--count', 'main').trim()).toBe(String(told));
    // A reason that looks like a trailer is none: only the last paragraph counts.
    expect(git('log', '-1', '--format=%(trailers:key=Reviewed-by,valueonly)', 'P-0142/B').trim().split('\n')).toEqual([
      'common.editor',
      'common.editor2',
    ]);
    expect(git('log', '-1', '--format=%B', 'P-0142/C')).toContain(
      'Ünïcode 🔧, <tags> & "quotes"\nSecond line\tand a tab\n',
    );
  });

  test('a withdrawn sheet is not in the tree, one that was brought back is, as it was', async () => {
    await writeHistory(folder);
    expect(git('ls-tree', '-r', '--name-only', 'main').trim()).toBe(SEAL);
    const { db } = await app();
    const [current] = await db.read<{ source: string }>(
      `SELECT r.source FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.number = 'P-0142'`,
    );
    expect(readFileSync(join(folder, SEAL), 'utf8')).toBe(current?.source);
    expect(log('%s', '--', SEAL)).toHaveLength(5);
  });

  test('written twice it has the same ids; later it goes on where it was', async () => {
    const first = await writeHistory(folder);
    const bare = join(folder, 'again.git');
    expect(await writeHistory(bare)).toEqual(first);
    rmSync(bare, { recursive: true });
    expect(await writeHistory(folder)).toEqual(first);
    await publishChange('P-0142', '03-01', { base: 'C', source: text({ word: 'new' }), reason: 'More' });
    const later = await writeHistory(folder);
    expect(later.commits).toBe(first.commits + 1);
    expect(git('rev-parse', 'main~1').trim()).toBe(first.tip);
    expect(readFileSync(join(folder, SEAL), 'utf8')).toContain('new cloth');
  });

  test('real addresses are in it only when asked for', async () => {
    await writeHistory(folder);
    expect(git('log', '--format=%ae%ce%B')).not.toContain('test.example');
    rmSync(folder, { recursive: true });
    await writeHistory(folder, { realAddresses: true });
    expect(log('%ce').at(-1)).toMatch(/@test\.example$/);
  });

  test('what is in the way is told, and nothing is overwritten', async () => {
    writeFileSync(join(folder, 'letter.txt'), 'mine');
    await expect(writeHistory(folder)).rejects.toThrow('is not empty and is no git repository');
    rmSync(join(folder, 'letter.txt'));
    await writeHistory(folder);
    writeFileSync(join(folder, SEAL), 'mine');
    await expect(writeHistory(folder)).rejects.toThrow('holds changes that are not committed');
    expect(readFileSync(join(folder, SEAL), 'utf8')).toBe('mine');
    git('-c', 'user.name=Me', '-c', 'user.email=me@x.invalid', 'commit', '-qam', 'Mine');
    await expect(writeHistory(folder)).rejects.toThrow('has commits that the book does not know');
    expect(readFileSync(join(folder, SEAL), 'utf8')).toBe('mine');
  });

  test('a branch of somebody else stays as it is, while the book goes on beside it', async () => {
    await writeHistory(folder);
    git('checkout', '-q', '-b', 'mine', 'main~2');
    const mine = git('rev-parse', 'mine');
    await publishChange('P-0142', '03-01', { base: 'C', source: text({ word: 'new' }), reason: 'More' });
    const { tip } = await writeHistory(folder);
    expect(git('rev-parse', 'mine')).toBe(mine);
    expect(git('symbolic-ref', 'HEAD').trim()).toBe('refs/heads/mine');
    expect(git('rev-parse', 'main').trim()).toBe(tip);
    expect(git('status', '--porcelain')).toBe('');
  });

  test('another repository that the environment names is not written into', async () => {
    const other = mkdtempSync(join(tmpdir(), 'matchmark-other-'));
    execFileSync('git', ['-C', other, 'init', '-q']);
    vi.stubEnv('GIT_DIR', join(other, '.git'));
    await writeHistory(folder);
    vi.unstubAllEnvs();
    expect(execFileSync('git', ['-C', other, 'for-each-ref'], { encoding: 'utf8' })).toBe('');
    expect(git('for-each-ref', 'refs/heads')).toContain('refs/heads/main');
    rmSync(other, { recursive: true });
  });

  test('without git it says so', async () => {
    vi.stubEnv('PATH', folder);
    await expect(writeHistory(folder)).rejects.toThrow('git was not found');
    vi.unstubAllEnvs();
  });
});

test('a shop gets its own book alone, and the common book none of it', async () => {
  await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north' }) });
  await publishFirst('P-0902', { shopId: shop('pier'), source: text({ title: 'Only pier' }) });
  await writeHistory(folder, { shopId: await shopBySlug('test-shop-north') });
  expect(log('%s')).toEqual(['P-0901 A, Only north']);
  rmSync(folder, { recursive: true });
  await writeHistory(folder);
  expect(log('%s')).toEqual(['P-0142 A, Reseal the test cover']);
  await expect(shopBySlug('elsewhere')).rejects.toThrow(
    'There is no shop elsewhere. There are: test-shop-north, test-shop-pier.',
  );
});
