import { describe, expect, it } from 'vitest';
import { raiseFromForm } from '@/server/flags/forms';
import { app } from '@/server/context';
import { jpegOf } from '../../factories/pictures';
import { signedIn } from '../api/support/network';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();

interface Slot {
  file?: Buffer | string;
  words?: string;
}

/** The page's form as a browser without scripts sends it: a field that was left empty goes along as an empty file. */
async function send(text: string, slots: Slot[], more: Record<string, string> = {}) {
  const form = new FormData();
  for (const [name, value] of Object.entries({ step: '', kind: 'wrong', text, ...more })) form.append(name, value);
  for (const [i, { file, words }] of slots.entries()) {
    const bytes = file === undefined ? '' : typeof file === 'string' ? file : new Uint8Array(file);
    form.append(
      `file-${i}`,
      new Blob([bytes], { type: 'application/octet-stream' }),
      file === undefined ? '' : 'photo.jpg',
    );
    form.append(`file-alt-${i}`, words ?? '');
  }
  const { actor } = await signedIn(who('north.apprentice'));
  return raiseFromForm(actor, 'P-0142', new Request('http://book.test/', { method: 'POST', body: form }));
}

const photos = async () =>
  (await app()).db.read<{ alt: string; subjectType: string | null }>(
    'SELECT alt, subjectType FROM attachments ORDER BY place, id',
  );

describe('the form of a flag, without a script', () => {
  it('takes up to three photos in one go', async () => {
    const slots = ['One', 'Two', 'Three'].map(async (words) => ({ file: await jpegOf(), words }));
    expect(await send('It weeps.', await Promise.all(slots))).toEqual({ done: true });
    expect(await photos()).toEqual(['One', 'Two', 'Three'].map((alt) => ({ alt, subjectType: 'flag' })));
  });

  it('takes none too', async () => {
    expect(await send('It weeps.', [{}, {}, {}])).toEqual({ done: true });
    expect(await photos()).toEqual([]);
  });

  it('keeps what was taken, and all that was typed, where something is amiss', async () => {
    const first = await send('It weeps.', [
      { file: await jpegOf(), words: 'The corner' },
      { file: 'no photo', words: 'The side' },
      { words: 'The top' },
    ]);
    expect(first).toMatchObject({
      done: false,
      status: 422,
      typed: { text: 'It weeps.' },
      photos: [{ alt: 'The corner' }],
      open: [
        { words: 'The side', error: expect.stringContaining('no photo that can be read') },
        { words: 'The top', error: null },
      ],
    });
    const { id } = (first as { photos: { id: string }[] }).photos[0]!;
    // Without its words it is not sent, and the words of the flag are asked for too.
    const second = await send(' ', [], { photo: id, [`alt-${id}`]: '' });
    expect(second).toMatchObject({
      done: false,
      errors: { text: 'Write what is wrong or unclear.' },
      photos: [{ id }],
    });
    const third = await send('It weeps.', [{ file: await jpegOf() }]);
    const bare = (third as { photos: { id: string }[] }).photos[0]!.id;
    expect(third).toMatchObject({
      status: 422,
      errors: { [`alt-${bare}`]: expect.stringContaining('Say what photo 1 shows') },
    });
    expect(await send('It weeps.', [], { photo: id, [`alt-${id}`]: 'The rear corner' })).toEqual({ done: true });
    expect(await photos()).toEqual([
      { alt: 'The rear corner', subjectType: 'flag' },
      { alt: '', subjectType: null },
    ]);
  });

  it('says which photo is too large, and reads the rest', async () => {
    const big = Buffer.alloc(15 * 1024 * 1024 + 1, 0xff);
    expect(
      await send('It weeps.', [
        { file: big, words: 'Big' },
        { file: await jpegOf(), words: 'Small' },
      ]),
    ).toMatchObject({
      status: 422,
      photos: [{ alt: 'Small' }],
      open: [{ words: 'Big', error: 'This photo has more than 15 MB. Choose a smaller one.' }],
    });
  });

  it('takes no photo of somebody else along', async () => {
    const { db } = await app();
    const { id } = await db.models.Attachment.create({
      uploaderId: who('north.senior').id,
      width: 1,
      height: 1,
      bytes: 1,
      hash: '0'.repeat(64),
      at: 'x',
      alt: 'Theirs',
    });
    expect(await send('It weeps.', [], { photo: id })).toEqual({ done: true });
    expect(await photos()).toEqual([{ alt: 'Theirs', subjectType: null }]);
  });
});
