import { expect, it } from 'vitest';
import { actOnReviewForm } from '@/server/review/reviewForm';
import { readProposal } from '@/server/review/readProposal';
import { signedIn } from '../api/support/network';
import { waiting } from '../api/support/review';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();

const form = (fields: Record<string, string>) => {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields)) data.set(name, value);
  return data;
};

it.each([[{}], [{ act: 'agree' }], [{ act: 'constructor', version: '2' }], [{ act: 'agree', version: '2x' }]])(
  'does nothing for a form that lost its fields: %j',
  async (fields) => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const { actor } = await signedIn(who('common.editor'));
    await expect(actOnReviewForm(actor, id, form(fields as Record<string, string>))).rejects.toMatchObject({
      status: 400,
    });
    expect((await readProposal(actor, id)).agreed).toEqual([]);
  },
);

it.each(['agree', 'publish', 'return', 'decline'])(
  'tells a reviewer whose text changed to judge the new one, in words of review: %s',
  async (act) => {
    const { id, version } = await waiting(who('north.senior'), 'P-0142');
    const { actor } = await signedIn(who('common.editor'));
    const outcome = await actOnReviewForm(
      actor,
      id,
      form({ act, version: String(version - 1), reason: 'Which cloth?', anchor: 'step:wipe' }),
    );
    expect(outcome).toMatchObject({
      kind: 'refused',
      status: 409,
      detail: expect.stringMatching(/another text than the one you judged.*judge what stands there/) as string,
      typed: 'Which cloth?',
      anchor: 'step:wipe',
    });
    expect(JSON.stringify(outcome)).not.toMatch(/save/);
  },
);

it('agrees to the version that was on the screen, and to no other', async () => {
  const { id, version } = await waiting(who('north.senior'), 'P-0142');
  const { actor } = await signedIn(who('common.editor'));
  const press = (seen: number) => actOnReviewForm(actor, id, form({ act: 'agree', version: String(seen) }));
  expect(await press(version - 1)).toMatchObject({ kind: 'refused', status: 409 });
  expect(await press(version)).toMatchObject({ kind: 'done', act: 'agree' });
  expect((await readProposal(actor, id)).agreed).toHaveLength(1);
});

it('overrides a clamp check by the form, and gives the typed reason back where it is refused', async () => {
  const { id, version } = await waiting(who('north.senior'), 'P-0142', { nm: 20 });
  const { actor } = await signedIn(who('common.editor'));
  const press = (fields: Record<string, string>) =>
    actOnReviewForm(actor, id, form({ act: 'override', version: String(version), torque: 'cover-bolt', ...fields }));
  expect(await press({ reason: ' ' })).toMatchObject({ kind: 'refused', status: 422, torque: 'cover-bolt' });
  expect(await press({ reason: 'Why', version: String(version - 1) })).toMatchObject({ status: 409, typed: 'Why' });
  expect((await readProposal(actor, id)).failing).toMatchObject([{ override: null }]);
  expect(await press({ reason: 'Stretch measured' })).toMatchObject({ kind: 'done', act: 'override' });
  expect((await readProposal(actor, id)).failing).toMatchObject([{ override: { reason: 'Stretch measured' } }]);
});
