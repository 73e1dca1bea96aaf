import { describe, expect, it, vi } from 'vitest';
import { StorageFull } from '@db/storageErrors';
import { BLANK_PROCEDURE } from '@/domain/procedure/blank';
import { readDraft } from '@/domain/writing/readDraft';
import { app } from '@/server/context';
import { writePlainly } from '@/server/review/plainWriting';
import { readProposal } from '@/server/review/readProposal';
import { returnToAuthor } from '@/server/review/giveBack';
import { saveProposal } from '@/server/review/saveProposal';
import { submit } from '@/server/review/submit';
import { beginProcedure } from '@/server/review/beginProcedure';
import { booksFor, openDraft, readWriting } from '@/server/review/writing';
import { signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who, shop } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

describe('opening a draft from the sheet', () => {
  it('begins one on the current revision, and goes on with it the next time', async () => {
    const senior = await actor('north.senior');
    const id = await openDraft(senior, 'P-0142');
    expect(await openDraft(senior, 'P-0142')).toBe(id);
    const { proposal, source, base, current } = await readWriting(senior, id);
    expect(proposal).toMatchObject({ state: 'draft', base: 'A', may: { edit: true } });
    expect([base?.letter, base?.source, current]).toEqual(['A', source, null]);
    expect(readDraft(source)).not.toBeNull();
  });

  it('goes on with a returned one, and begins anew beside one that is being reviewed', async () => {
    const senior = await actor('north.senior');
    const id = await openDraft(senior, 'P-0142');
    await saveProposal(senior, id, null, { source: text({ word: 'lint-free' }), reason: 'Fluff in the joint' });
    await submit(senior, id);
    const other = await openDraft(senior, 'P-0142');
    expect(other).not.toBe(id);
    await returnToAuthor(await actor('common.editor'), id, { reason: 'Which cloth?', anchor: null }, null);
    expect(await openDraft(senior, 'P-0142')).toBe(id);
  });

  it('is refused to an apprentice, and hides what is not there', async () => {
    await expect(openDraft(await actor('north.apprentice'), 'P-0142')).rejects.toMatchObject({ status: 403 });
    await expect(openDraft(await actor('north.senior'), 'P-9999')).rejects.toMatchObject({ status: 404 });
    const id = await openDraft(await actor('north.senior'), 'P-0142');
    await expect(readWriting(await actor('pier.senior'), id)).rejects.toMatchObject({ status: 404 });
  });

  it('gives the form a text in its shape where it can be read, and the text itself where not', async () => {
    const senior = await actor('north.senior');
    const id = await openDraft(senior, 'P-0142');
    const odd = text({ word: '**clean**' }).replace(/^title: (.*)$/m, 'title:    "$1"');
    await saveProposal(senior, id, null, { source: odd });
    expect(readDraft(odd)).toBeNull();
    expect(readDraft((await readWriting(senior, id)).source)).not.toBeNull();
    await saveProposal(senior, id, null, { source: 'no front matter' });
    expect((await readWriting(senior, id)).source).toBe('no front matter');
  });
});

describe('a new procedure', () => {
  it('offers the books that somebody may write for', async () => {
    const books = async (name: string) => {
      const { actor, me } = await signedIn(who(name));
      return booksFor(actor, me).map(({ book }) => book);
    };
    expect(await books('north.technician')).toEqual(['common', shop('north')]);
    expect(await books('north.apprentice')).toEqual([]);
    expect(await books('common.editor')).toContain('common');
  });

  it('begins from the blank under its own title', async () => {
    const technician = await actor('north.technician');
    const id = await beginProcedure(technician, shop('north'), 'Fit the fan', { from: 'empty' });
    const { source, title, base } = await readProposal(technician, id);
    expect([title, base]).toEqual(['Fit the fan', null]);
    expect(source).toBe(BLANK_PROCEDURE.replace('A new procedure', 'Fit the fan'));
  });
});

describe('the plain form', () => {
  const form = (fields: Record<string, string>) => {
    const data = new FormData();
    for (const [name, value] of Object.entries(fields)) data.set(name, value);
    return data;
  };
  it('keeps, proposes, and gives back what was typed where it is refused', async () => {
    const senior = await actor('north.senior');
    const id = await openDraft(senior, 'P-0142');
    const source = text({ word: 'lint-free' });
    const typed = { source: source.replace(/\n/g, '\r\n'), reason: '', version: '1' };
    expect(await writePlainly(senior, id, form({ ...typed, act: 'keep' }))).toEqual({ done: 'kept' });
    expect((await readProposal(senior, id)).source).toBe(source);
    expect(await writePlainly(senior, id, form({ ...typed, version: '2', act: 'propose' }))).toMatchObject({
      refusal: { status: 422, errors: [{ path: 'reason' }] },
      source,
    });
    expect(await writePlainly(senior, id, form({ ...typed, act: 'keep', source: 'other' }))).toMatchObject({
      refusal: { status: 409, detail: expect.stringMatching(/changed elsewhere.*save once more/) as string },
      source: 'other',
    });
    const reasoned = form({ ...typed, version: '2', reason: 'Fluff', act: 'propose' });
    expect(await writePlainly(senior, id, reasoned)).toEqual({ done: 'proposed' });
    expect((await readProposal(senior, id)).state).toBe('proposed');
    // It went on in another tab: what is typed in this one comes back all the same.
    const late = form({ ...typed, version: '3', reason: 'And more', act: 'keep' });
    expect(await writePlainly(senior, id, late)).toMatchObject({ refusal: { status: 409 }, reason: 'And more' });
  });

  it('gives it back where the disk is full too, and passes on what no second press can mend', async () => {
    const senior = await actor('north.senior');
    const id = await openDraft(senior, 'P-0142');
    const fields = { source: text({ word: 'dry' }), reason: 'Fluff', version: '1', act: 'keep' };
    const { db } = await app();
    const log = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const full = vi.spyOn(db, 'write').mockRejectedValue(new StorageFull('SQLITE_FULL'));
    expect(await writePlainly(senior, id, form(fields))).toMatchObject({
      refusal: { status: 503, detail: expect.stringContaining('cannot write to its disk') as string },
      reason: 'Fluff',
    });
    // Whoever runs the server reads of it.
    expect(log).toHaveBeenCalledTimes(1);
    log.mockRestore();
    full.mockRejectedValue(new TypeError('A fault of ours'));
    await expect(writePlainly(senior, id, form(fields))).rejects.toThrow('A fault of ours');
    full.mockRestore();
    await expect(writePlainly(await actor('pier.senior'), id, form(fields))).rejects.toMatchObject({ status: 404 });
    await expect(writePlainly(senior, id, form({ ...fields, act: 'eat' }))).rejects.toMatchObject({ status: 400 });
  });
});
