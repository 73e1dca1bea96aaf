import { describe, expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { jpegOf } from '../../factories/pictures';
import { call } from '../api/support/call';
import { publishFirst, type Member } from '../api/support/network';
import { waiting } from '../api/support/review';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';
import { ask, minutes, picture, remove, statusOf, upload } from './support';

const { who, shop } = useNetwork();
const photo = async (as: Member, alt = 'The rear corner of the gasket'): Promise<string> =>
  (await upload(as, await jpegOf(), { alt })).body.id as string;
const sees = async (name: string, id: string) => (await statusOf(picture(who(name), id))) === 200;

/** A proposal on a sheet of the north shop's own book. */
async function shopProposal(): Promise<string> {
  await publishFirst('P-0700', { shopId: shop('north') });
  return (await waiting(who('north.technician'), 'P-0700')).id;
}

describe('photos in a thread', () => {
  it('stand in the message in the order chosen, with their words, for all who see the text', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const editor = who('common.editor');
    const [one, two] = [await photo(editor), await photo(editor, '')];
    const started = await ask(editor, id, [{ id: two, alt: 'The washer, pressed flat' }, one]);
    expect(started.status).toBe(201);
    expect(started.body.messages[0].photos).toMatchObject([
      {
        id: two,
        alt: 'The washer, pressed flat',
        url: `/photos/${two}`,
        removed: null,
        may: { remove: true, takeOff: false },
      },
      { id: one, alt: 'The rear corner of the gasket', width: 320, height: 200 },
    ]);
    const answer = await photo(who('north.senior'));
    const replied = await call(who('north.senior'), 'POST', `/threads/${started.body.id}/messages`, {
      body: { text: 'Here.', photos: [answer] },
    });
    expect(replied.body.messages[1].photos).toMatchObject([{ id: answer }]);
    // A proposed text of the common book is seen by every shop; so are its threads.
    for (const name of ['north.apprentice', 'pier.senior', 'common.editor2']) {
      expect(await sees(name, one), name).toBe(true);
      const { body } = await call(who(name), 'GET', `/proposals/${id}/threads`);
      expect(body.items[0].messages[1].photos[0]).toMatchObject({
        id: answer,
        may: { remove: name === 'common.editor2' },
      });
    }
    expect(await sees('nobody', one)).toBe(false);
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('of a shop are hidden from every other shop, as if they were not there', async () => {
    const id = await shopProposal();
    const sent = await photo(who('north.editor'));
    expect((await ask(who('north.editor'), id, [sent])).status).toBe(201);
    for (const name of ['north.apprentice', 'north.owner']) expect(await sees(name, sent), name).toBe(true);
    for (const name of ['pier.editor', 'pier.apprentice', 'common.editor', 'steward', 'nobody']) {
      const refused = await picture(who(name), sent).catch((error: unknown) => error);
      const unknown = await picture(who(name), '0190a1b2-0000-7000-8000-000000000000').catch((error: unknown) => error);
      expect(refused, name).toMatchObject({ status: 404 });
      expect(refused, name).toEqual(unknown);
      expect((await remove(who(name), sent)).status, name).toBe(404);
      expect((await call(who(name), 'DELETE', `/photos/${sent}`)).status, name).toBe(404);
    }
  });

  it('are refused where they are not there, not mine, sent already, without words or too many; nothing is written', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const editor = who('common.editor');
    const theirs = await photo(who('north.senior'));
    const mine = await photo(editor);
    const bare = await photo(editor, '');
    const cases: [unknown[], string, RegExp][] = [
      [[theirs], 'photos.0', /not there any more/],
      [[mine, '0190a1b2-0000-7000-8000-000000000000'], 'photos.1', /Photo 2 is not there/],
      [[mine, mine], 'photos.1', /Photo 2/],
      [[mine, bare], 'photos.1', /Say what photo 2 shows/],
      [[{ id: mine, alt: '  ' }], 'photos.0', /Say what photo 1 shows/],
      [Array.from({ length: 7 }, () => mine), 'photos', /6 or fewer/],
      [['not-an-id'], 'photos.0', /form/],
    ];
    for (const [photos, path, words] of cases) {
      const answer = await ask(editor, id, photos);
      expect({ status: answer.status, error: answer.body.errors[0] }).toEqual({
        status: 422,
        error: { path, message: expect.stringMatching(words) },
      });
    }
    expect((await call(editor, 'GET', `/proposals/${id}/threads`)).body.items).toEqual([]);
    expect((await ask(editor, id, [mine])).status).toBe(201);
    expect((await ask(editor, id, [mine], 'Again')).status).toBe(422);
  });
});

describe('photos on a flag', () => {
  it('are seen by whoever may answer it, and by nobody else', async () => {
    const sent = await photo(who('north.apprentice'));
    const raised = await call(who('north.apprentice'), 'POST', '/procedures/P-0142/flags', {
      body: { kind: 'wrong', text: 'It weeps here.', photos: [sent] },
    });
    expect(raised).toMatchObject({ status: 201, body: { photos: [{ id: sent, may: { remove: true } }] } });
    for (const name of ['north.apprentice', 'north.senior', 'common.editor'])
      expect(await sees(name, sent), name).toBe(true);
    for (const name of ['north.technician', 'pier.senior', 'pier.owner', 'nobody'])
      expect(await sees(name, sent), name).toBe(false);
    const { body } = await call(who('north.senior'), 'GET', '/flags');
    expect(body.toAnswer[0].photos).toMatchObject([{ id: sent, may: { remove: false } }]);
    const again = await call(who('north.apprentice'), 'POST', '/procedures/P-0142/flags', {
      body: { kind: 'wrong', text: 'It weeps here.', photos: [sent] },
    });
    expect(again.body.id).toBe(raised.body.id);
  });
});

describe('photos at the reason of a proposal', () => {
  const draft = async (as: Member) =>
    (
      await call(as, 'POST', '/procedures/P-0142/proposals', {
        body: { base: 'A', source: text({ word: 'dry' }), reason: 'Seen on five engines.' },
      })
    ).body as { id: string };
  const add = (as: Member, id: string, photos: unknown[]) =>
    call(as, 'POST', `/proposals/${id}/photos`, { body: { photos } });

  it('are the author’s alone to add and to take off, until it is sent in', async () => {
    const author = who('north.senior');
    const { id } = await draft(author);
    const [one, two] = [await photo(author), await photo(author)];
    expect(await add(author, id, [one, two])).toMatchObject({
      status: 201,
      body: { items: [{ id: one, may: { takeOff: true, remove: false } }, { id: two }] },
    });
    expect(await sees('common.editor', one)).toBe(false);
    expect((await add(who('common.editor'), id, [await photo(who('common.editor'))])).status).toBe(404);
    expect((await call(author, 'DELETE', `/photos/${two}`)).status).toBe(204);
    expect((await call(author, 'POST', `/proposals/${id}/submit`)).status).toBe(200);
    expect(await sees('common.editor', one)).toBe(true);
    const { body } = await call(who('common.editor'), 'GET', `/proposals/${id}`);
    expect(body.photos).toMatchObject([{ id: one, may: { takeOff: false, remove: true } }]);
    expect((await call(author, 'DELETE', `/photos/${one}`)).status).toBe(409);
    expect((await add(author, id, [await photo(author)])).status).toBe(409);
    await call(who('common.editor'), 'POST', `/proposals/${id}/return`, { body: { reason: 'Show the washer.' } });
    const three = await photo(author);
    const list = await add(author, id, [three]);
    expect(list.body.items.map((item: { may: unknown }) => item.may)).toEqual([
      { takeOff: false, remove: true },
      { takeOff: true, remove: false },
    ]);
    expect((await call(author, 'DELETE', `/photos/${one}`)).status).toBe(409);
    expect((await call(author, 'DELETE', `/photos/${three}`)).status).toBe(204);
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('are six at most', async () => {
    const author = who('north.senior');
    const { id } = await draft(author);
    const ids = await Promise.all(Array.from({ length: 7 }, () => photo(author)));
    expect((await add(author, id, ids.slice(0, 4))).status).toBe(201);
    expect((await add(author, id, ids.slice(4))).status).toBe(422);
    expect((await add(author, id, ids.slice(4, 6))).status).toBe(201);
    const { db } = await app();
    await expect(
      db.write(() =>
        db.models.Attachment.update(
          { subjectType: 'proposal', subjectId: id, attachedAt: minutes(0), place: 9 },
          { where: { id: ids[6]! } },
        ),
      ),
    ).rejects.toThrow(/more than six/);
  });

  it('go with the draft', async () => {
    const author = who('north.senior');
    const { id } = await draft(author);
    const sent = await photo(author);
    await add(author, id, [sent]);
    const { db } = await app();
    await expect(db.write(() => db.sequelize.query(`DELETE FROM revisions WHERE id = '${id}'`))).rejects.toThrow(
      /before it/,
    );
    expect((await call(author, 'DELETE', `/proposals/${id}`)).status).toBe(204);
    expect(await db.read('SELECT id FROM attachments')).toEqual([]);
    expect(await statusOf(picture(author, sent))).toBe(404);
  });
});

describe('serving a photo', () => {
  it('lets the browser keep it, privately, and answers 304', async () => {
    const id = await photo(who('north.senior'));
    const answer = await picture(who('north.senior'), id);
    const headers = Object.fromEntries(answer.headers);
    expect(headers).toMatchObject({
      'content-type': 'image/jpeg',
      'content-disposition': `inline; filename="photo-${id}.jpg"`,
      'cache-control': 'private, max-age=31536000, immutable',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "default-src 'none'; sandbox",
      vary: 'Cookie',
    });
    const again = await picture(who('north.senior'), id, 'full', { 'if-none-match': headers['etag']! });
    expect(again.status).toBe(304);
    expect((await picture(who('north.senior'), id, 'small', { 'if-none-match': headers['etag']! })).status).toBe(200);
    const stranger = picture(who('pier.senior'), id, 'full', { 'if-none-match': headers['etag']! });
    expect(await statusOf(stranger)).toBe(404);
  });
});
