import { describe, expect, it } from 'vitest';
import { readComparePage } from '@/server/book/comparePage';
import { publish } from '@/server/review/publish';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { publishFirst, signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who, shop } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

/** Publishes the next revision of P-0142. */
async function follow(base: string, word: string) {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base, source: text({ word }), reason: 'A reason' });
  await submit(author, id);
  await publish(await actor('common.editor'), id);
}
const page = async (from: string | null, to: string | null, name = 'north.apprentice') =>
  readComparePage(await actor(name), 'P-0142', { from, to });

describe('two revisions to compare', () => {
  it('says of a sheet with one revision that there is nothing to compare it with', async () => {
    expect(await page(null, null)).toMatchObject({
      from: 'A',
      to: 'A',
      compared: null,
      problem: 'P-0142 has only revision A, so there is nothing to compare it with yet.',
    });
    expect(await page('A', 'B')).toMatchObject({
      compared: null,
      problem: 'P-0142 has no revision “B”. It has only revision A.',
    });
  });

  it('takes the current one and the one before it, or the one before what was asked for', async () => {
    await follow('A', 'dry');
    await follow('B', 'soft');
    expect(await page(null, null)).toMatchObject({ from: 'B', to: 'C', problem: null });
    expect(await page(null, 'B')).toMatchObject({ from: 'A', to: 'B', problem: null });
    expect(await page('A', null)).toMatchObject({ from: 'A', to: 'C', problem: null });
    // Nothing stands before the first: it is compared with itself, and the page says so.
    expect(await page(null, 'A')).toMatchObject({ from: 'A', to: 'A', compared: { comparison: { identical: true } } });
  });

  it('compares either way round, and reads letters as they are typed', async () => {
    await follow('A', 'dry');
    const words = async (from: string, to: string) => {
      const { compared } = await page(from, to);
      return compared?.comparison.steps.flatMap(({ body }) => body.filter(({ kind }) => kind !== 'same'));
    };
    expect(await words(' a ', 'b')).toEqual([
      { kind: 'removed', text: 'clean' },
      { kind: 'added', text: 'dry' },
    ]);
    expect(await words('B', 'A')).toEqual([
      { kind: 'removed', text: 'dry' },
      { kind: 'added', text: 'clean' },
    ]);
  });

  it('names each letter that is not there once, and shows no more of it than fits', async () => {
    await follow('A', 'dry');
    expect((await page('X', 'X')).problem).toBe('P-0142 has no revision “X”. It has revisions A to B.');
    expect((await page('Q'.repeat(500), '')).problem).toBe(
      `P-0142 has no revision “${'Q'.repeat(12)}” or without a letter. It has revisions A to B.`,
    );
  });

  it('hides the sheets of another shop', async () => {
    await publishFirst('P-1001', { shopId: shop('pier') });
    const other = readComparePage(await actor('north.editor'), 'P-1001', { from: null, to: null });
    await expect(other).rejects.toMatchObject({ status: 404 });
  });
});
