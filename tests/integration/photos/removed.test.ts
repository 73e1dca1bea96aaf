import { describe, expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { atTime } from '@/server/clock';
import { app } from '@/server/context';
import { sweepPhotos } from '@/server/photos/sweep';
import { jpegOf } from '../../factories/pictures';
import { call } from '../api/support/call';
import type { Member } from '../api/support/network';
import { waiting } from '../api/support/review';
import { useNetwork } from '../api/support/useNetwork';
import { ask, minutes, picture, remove, statusOf, upload } from './support';

const { who } = useNetwork();
const photo = async (as: Member, alt = 'The rear corner of the gasket'): Promise<string> =>
  (await upload(as, await jpegOf(), { alt })).body.id as string;
const sees = async (name: string, id: string) => (await statusOf(picture(who(name), id))) === 200;

describe('removing a photo that was sent', () => {
  it('takes a reason, leaves who, when and why, and the picture is gone', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const sent = await photo(who('pier.senior'));
    const { body } = await ask(who('pier.senior'), id, [sent]);
    expect((await remove(who('north.senior'), sent)).status).toBe(403);
    expect((await remove(who('common.editor'), sent, ' ')).status).toBe(422);
    const removed = await remove(who('common.editor'), sent);
    expect(removed).toMatchObject({
      status: 200,
      body: {
        alt: '',
        removed: { person: { name: 'common.editor' }, reason: 'It shows a customer.' },
        may: { remove: false },
      },
    });
    expect(await sees('pier.senior', sent)).toBe(false);
    expect((await remove(who('common.editor'), sent)).status).toBe(409);
    const thread = await call(who('north.apprentice'), 'GET', `/proposals/${id}/threads`);
    expect(thread.body.items[0]).toMatchObject({
      id: body.id,
      messages: [{ photos: [{ removed: { reason: 'It shows a customer.' } }] }],
    });
    const { db } = await app();
    const [entry] = await db.read<{ detail: string }>(`SELECT detail FROM auditEntries WHERE act = 'photo.removed'`);
    expect(JSON.parse(entry!.detail)).toMatchObject({
      number: 'P-0142',
      from: 'message',
      reason: 'It shows a customer.',
    });
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('is for whoever sent it within ten minutes', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const [one, two] = [await photo(who('pier.senior')), await photo(who('pier.senior'))];
    await ask(who('pier.senior'), id, [one, two]);
    expect((await atTime(minutes(9), () => remove(who('pier.senior'), one))).status).toBe(200);
    const late = await atTime(minutes(11), () => remove(who('pier.senior'), two));
    expect(late).toMatchObject({ status: 403, body: { detail: expect.stringContaining('more than ten minutes ago') } });
    expect((await atTime(minutes(11), () => remove(who('common.editor2'), two))).status).toBe(200);
  });

  it('is held by the database too', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const sent = await photo(who('pier.senior'));
    const other = await photo(who('pier.senior'));
    const { body } = await ask(who('pier.senior'), id, [sent]);
    const { db } = await app();
    const tries = (sql: string) => db.write(() => db.sequelize.query(sql));
    const on = `WHERE id = '${sent}'`;
    await expect(tries(`DELETE FROM attachments ${on}`)).rejects.toThrow(/never deleted/);
    await expect(tries(`UPDATE attachments SET hash = '${'1'.repeat(64)}' ${on}`)).rejects.toThrow(/never changed/);
    await expect(tries(`UPDATE attachments SET alt = 'x' ${on}`)).rejects.toThrow(/stays with/);
    const message = body.messages[0].id as string;
    const to = (type: string, subject: string, alt = 'x') =>
      `UPDATE attachments SET subjectType = '${type}', subjectId = '${subject}', attachedAt = 'x', place = 5, alt = '${alt}' WHERE id = '${other}'`;
    await expect(tries(to('proposal', id))).rejects.toThrow(/whoever uploaded it/);
    await expect(tries(to('job', message))).rejects.toThrow(/whoever uploaded it/);
    await expect(tries(to('message', message, ' '))).rejects.toThrow(/CHECK/);
    await remove(who('common.editor'), sent);
    await expect(tries(`UPDATE attachments SET removedWhy = 'x' ${on}`)).rejects.toThrow(/stays removed/);
  });
});

describe('the sweep', () => {
  it('throws away what was not sent within a day, and nothing else', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const editor = who('common.editor');
    const sent = await photo(editor);
    await ask(editor, id, [sent]);
    const unsent = await photo(editor);
    expect(await atTime(minutes(23 * 60), sweepPhotos)).toBe(0);
    expect(await sees('common.editor', unsent)).toBe(true);
    expect(await atTime(minutes(25 * 60), sweepPhotos)).toBe(1);
    expect(await sees('common.editor', unsent)).toBe(false);
    expect(await sees('common.editor', sent)).toBe(true);
  });

  it('comes with every upload', async () => {
    const old = await photo(who('pier.senior'));
    await atTime(minutes(25 * 60), () => photo(who('north.senior')));
    expect(await sees('pier.senior', old)).toBe(false);
  });
});
