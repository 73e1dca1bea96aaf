import { beforeEach, describe, expect, test } from 'vitest';
import type { Database } from '@db/database';
import { migrate, migrateDownTo } from '@db/migrations/migrate';
import type { Procedure, Revision } from '@db/models/book';
import { openTestBook } from '../../setup/database';

const HASH = 'a'.repeat(64);
const OTHER = 'b'.repeat(64);
const head = {} as NonNullable<Revision['head']>;

let db: Database;
let procedure: Procedure;
let published: Revision;
const people: Record<string, string> = {};

beforeEach(async () => {
  ({ db } = await openTestBook());
  const { Person, Procedure, Revision } = db.models;
  const release = await Person.create({ kind: 'release', email: null, name: 'Release' });
  people['release'] = release.id;
  for (const name of ['author', 'first', 'second']) {
    const { id } = await Person.create({ email: `${name}@test.example`, name, passwordHash: 'x' });
    people[name] = id;
    await db.models.Membership.create({ personId: id, scope: 'common', role: 'editor' });
  }
  procedure = await Procedure.create({ number: 'P-0001', bookKind: 'common' });
  published = await Revision.create({ ...text('release', HASH), letter: 'A', state: 'published', publishedAt: 'then' });
  await procedure.update({ currentRevisionId: published.id });
});

const text = (author: string, hash: string) => ({
  procedureId: procedure.id,
  authorId: people[author] ?? '',
  source: 'text',
  hash,
  head,
});

const propose = (change: { critical?: boolean } = {}) =>
  db.models.Revision.create({
    ...text('author', OTHER),
    parentId: published.id,
    state: 'proposed',
    everProposed: true,
    ...change,
  });

const agree = (revisionId: string, person: string, hash = OTHER, base: string | null = 'A') =>
  db.write(() => db.models.Agreement.create({ revisionId, personId: people[person] ?? '', hash, base, at: 'now' }));

const publish = (revision: Revision) =>
  db.write(async () => {
    await published.update({ state: 'superseded' });
    await revision.update({ state: 'published', letter: 'B', publishedAt: 'now' });
  });

const refused = (act: () => Promise<unknown>, message: string | RegExp) =>
  expect(db.write(act)).rejects.toThrow(message);

describe('the database itself holds that', () => {
  test.each(['source', 'hash', 'letter', 'authorId', 'reason', 'publishedAt', 'parentId'] as const)(
    'the %s of a published revision never changes',
    async (column) => {
      const value =
        column === 'hash' ? OTHER : column === 'letter' ? 'C' : column === 'authorId' ? people['first'] : 'x';
      await refused(() => published.update({ [column]: value }), 'A published revision never changes');
    },
  );

  test('nor does that of a superseded one, which never comes back', async () => {
    await published.update({ state: 'superseded' });
    await refused(() => published.update({ source: 'x' }), 'A published revision never changes');
    await refused(() => published.update({ state: 'published' }), 'cannot go from its state');
  });

  test('a letter is one of ASME Y14.35, and stands on what is published and nothing else', async () => {
    const { Revision } = db.models;
    const other = await db.models.Procedure.create({ number: 'P-0002', bookKind: 'common' });
    const row = { ...text('release', HASH), procedureId: other.id, state: 'published', publishedAt: 'x' } as const;
    for (const letter of ['I', 'O', 'Q', 'S', 'X', 'Z', 'AO', 'a', '1', 'AAA', ''])
      await refused(() => Revision.create({ ...row, letter }), 'CHECK constraint');
    await refused(() => Revision.create({ ...row, letter: null }), 'CHECK constraint');
    await refused(() => propose().then((draft) => draft.update({ letter: 'B' })), 'CHECK constraint');
  });

  test('one revision of a procedure is current, and each letter is given once', async () => {
    const { Revision } = db.models;
    const second = { ...text('release', OTHER), state: 'published', publishedAt: 'x' } as const;
    await refused(() => Revision.create({ ...second, letter: 'B' }), 'Validation error');
    await published.update({ state: 'superseded' });
    await refused(() => Revision.create({ ...second, letter: 'A' }), 'never written over');
  });

  test('only a release enters the book as published', async () => {
    await published.update({ state: 'superseded' });
    await refused(
      () => db.models.Revision.create({ ...text('author', OTHER), letter: 'B', state: 'published', publishedAt: 'x' }),
      'Only a release',
    );
  });

  test('nobody agrees to their own proposal', async () => {
    const proposal = await propose();
    await expect(agree(proposal.id, 'author')).rejects.toThrow('Nobody agrees to their own proposal');
  });

  test('an agreement is given to the proposed text, and then stays', async () => {
    const proposal = await propose();
    await expect(agree(proposal.id, 'first', HASH)).rejects.toThrow('the text that is proposed');
    await agree(proposal.id, 'first');
    await refused(() => db.models.Agreement.update({ hash: HASH }, { where: {} }), 'never changed');
    await refused(() => db.models.Agreement.destroy({ where: {} }), 'never deleted');
  });

  test('a proposal is published with one agreement, a critical one with two, all to this text on this base', async () => {
    const ordinary = await propose();
    await expect(publish(ordinary)).rejects.toThrow('only with the agreements it needs');
    await agree(ordinary.id, 'first', OTHER, null);
    await expect(publish(ordinary)).rejects.toThrow('only with the agreements it needs');

    const critical = await propose({ critical: true });
    await agree(critical.id, 'first');
    await published.reload();
    await expect(publish(critical)).rejects.toThrow('only with the agreements it needs');
    await agree(critical.id, 'second');
    await published.reload();
    await publish(critical);
    expect((await critical.reload()).state).toBe('published');
  });

  test('what was proposed is never deleted; a draft that nobody saw can be', async () => {
    const proposal = await propose();
    await refused(() => proposal.destroy(), 'never deleted');
    await refused(() => published.destroy(), 'never deleted');
    const draft = await db.models.Revision.create({ ...text('author', OTHER), state: 'draft' });
    await db.write(() => draft.destroy());
  });

  test('the current revision is a published one of the same procedure', async () => {
    const proposal = await propose();
    await refused(() => procedure.update({ currentRevisionId: proposal.id }), 'is its published one');
    const other = await db.models.Procedure.create({ number: 'P-0002', bookKind: 'common' });
    await refused(() => other.update({ currentRevisionId: published.id }), 'is its published one');
  });

  test('a procedure keeps its number and its book; a shop book names its shop', async () => {
    await refused(() => procedure.update({ number: 'P-0009' }), 'keeps its number');
    await refused(() => db.models.Procedure.create({ number: 'P-0003', bookKind: 'shop' }), 'CHECK constraint');
    await refused(() => db.models.Procedure.create({ number: 'P-0001', bookKind: 'common' }), 'Validation error');
  });

  test('an e-mail address is had once, whatever its capitals', async () => {
    await refused(() => db.models.Person.create({ email: 'FIRST@test.example', name: 'again' }), 'Validation error');
  });

  test('a role belongs where it can be held', async () => {
    const { Membership, Shop } = db.models;
    const shop = await Shop.create({ name: 'Shop' });
    const personId = people['first'] ?? '';
    const wrong = [
      { scope: 'shop', role: 'editor' },
      { scope: 'shop', shopId: shop.id, role: 'steward' },
      { scope: 'common', role: 'owner' },
      { scope: 'network', shopId: shop.id, role: 'steward' },
    ] as const;
    for (const membership of wrong) await refused(() => Membership.create({ personId, ...membership }), 'CHECK');
    // Each of the three is an editor of the common book already.
    await refused(() => Membership.create({ personId, scope: 'common', role: 'editor' }), 'Validation error');
  });

  test('a shop sets each rule of thumb once, to a number, by somebody', async () => {
    const { Shop, ShopRule } = db.models;
    const [shop, other] = [await Shop.create({ name: 'Shop' }), await Shop.create({ name: 'Other' })];
    const row = { shopId: shop.id, name: 'injector-set.deviation', value: 4, setById: people['first'] ?? '' };
    for (const name of ['', 'deviation', '.deviation', 'injector-set.', 'Injector.x'])
      await refused(() => ShopRule.create({ ...row, name }), 'CHECK');
    for (const value of [1e16, -1e16, Infinity]) await refused(() => ShopRule.create({ ...row, value }), 'CHECK');
    await refused(() => ShopRule.create({ ...row, value: NaN }), /CHECK|NOT NULL|notNull|no such column/);
    for (const wrong of [{ shopId: 'nowhere' }, { setById: 'nobody' }])
      await refused(() => ShopRule.create({ ...row, ...wrong }), 'FOREIGN KEY');
    await ShopRule.create(row);
    await refused(() => ShopRule.create({ ...row, value: 5 }), 'Validation error');
    await ShopRule.create({ ...row, shopId: other.id });
    const [kept] = await db.read<{ value: number }>('SELECT value FROM shopRules WHERE shopId = :id', { id: shop.id });
    expect(kept).toEqual({ value: 4 });
  });

  test('nothing points at what is not there', async () => {
    await refused(
      () => db.models.Membership.create({ personId: 'nobody', scope: 'common', role: 'editor' }),
      'FOREIGN KEY',
    );
    await refused(() => db.models.Person.destroy({ where: { id: people['release'] ?? '' } }), 'FOREIGN KEY');
  });
});

test('the migrations can be taken back and made again', async () => {
  const { db: empty } = await openTestBook();
  await migrateDownTo(empty, '0001-tables');
  expect(await empty.read("SELECT name FROM sqlite_master WHERE name = 'revisions'")).toEqual([]);
  await migrate(empty);
  expect(await empty.models.Revision.count()).toBe(0);
});
