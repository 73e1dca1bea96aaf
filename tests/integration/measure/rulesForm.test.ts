import { describe, expect, it, vi } from 'vitest';
import { actOnRulesForm } from '@/server/measure/rulesForm';
import { readRules } from '@/server/measure/rules';
import { shopOfRulesPage } from '@/server/measure/rulesPage';
import { setRule } from '@/server/measure/setRules';
import { signedIn } from '../api/support/network';
import { useNetwork } from '../api/support/useNetwork';

vi.mock('@/domain/worksheets/registry', () => import('../../factories/registryWithSample'));

const { who, shop } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

/** The form as the page would send it: what was set when it was made, and what is typed over it. */
function form(typed: Record<string, string>, was: Record<string, string> = {}, units = 'metric') {
  const data = new FormData();
  data.set('units', units);
  for (const [name, value] of Object.entries(typed)) {
    data.set(`value.sample.${name}`, value);
    data.set(`was.sample.${name}`, was[name] ?? '');
  }
  return data;
}
const send = async (data: FormData, name = 'north.owner') => actOnRulesForm(await actor(name), shop('north'), data);
const set = async () => {
  const { settings } = await readRules(await actor('north.owner'));
  return Object.fromEntries(
    settings.flatMap((one) => (one.rule.worksheet.name === 'sample' ? [[one.rule.field, one.set?.value]] : [])),
  );
};

describe('the form of the rules page', () => {
  it('sets what was typed, and goes back to the usual where a box was emptied', async () => {
    expect(await send(form({ gap: '2 thou', deviation: '', factor: '0,15' }))).toEqual({ kind: 'saved', changed: 2 });
    expect(await set()).toEqual({ gap: 0.0508, deviation: undefined, factor: 0.15 });
    expect(await send(form({ gap: ' ', factor: '0.15' }, { gap: '0.0508', factor: '0.15' }))).toMatchObject({
      changed: 1,
    });
    expect(await set()).toEqual({ gap: undefined, deviation: undefined, factor: 0.15 });
  });

  it('reads bare numbers in the units that the page was made in, and leaves alone what it showed rounded', async () => {
    expect(await send(form({ gap: '0.003' }, {}, 'inch'))).toMatchObject({ changed: 1 });
    expect(await set()).toMatchObject({ gap: 0.0762 });
    await setRule(await actor('north.owner'), 'sample.gap', 0.08);
    // 0.08 mm stands in an inch box as 0.00315, which would be 0.080 01 mm.
    expect(await send(form({ gap: '0.00315' }, { gap: '0.08' }, 'inch'))).toEqual({ kind: 'saved', changed: 0 });
    expect(await set()).toMatchObject({ gap: 0.08 });
  });

  it('saves nothing where one value cannot be, and keeps all that was typed', async () => {
    expect(await send(form({ gap: 'wide', deviation: '4', factor: '7' }))).toEqual({
      kind: 'refused',
      status: 422,
      detail: 'Some values cannot be used. Nothing was saved.',
      errors: {
        'sample.gap': 'Gap allowed: "wide" is no number. Write, for example, 0.35 mm or 14 thou.',
        'sample.factor': 'Nut factor must be 1 or less.',
      },
      typed: { 'sample.gap': 'wide', 'sample.deviation': '4', 'sample.factor': '7' },
    });
    expect(await set()).toMatchObject({ deviation: undefined });
  });

  it('overwrites nothing that somebody else has set since, and nothing that was not touched', async () => {
    await setRule(await actor('steward'), 'sample.gap', 0.09, shop('north'));
    await setRule(await actor('steward'), 'sample.factor', 0.3, shop('north'));
    const late = form({ gap: '0.07', deviation: '4', factor: '' });
    expect(await send(late)).toMatchObject({
      kind: 'refused',
      status: 409,
      errors: { 'sample.gap': 'steward has set 0.09 mm in the meantime. Save again to have yours.' },
      typed: { 'sample.gap': '0.07', 'sample.deviation': '4' },
    });
    expect(await set()).toEqual({ gap: 0.09, deviation: undefined, factor: 0.3 });
    // The page comes back with what stands now, so that the second press is meant.
    expect(await send(form({ gap: '0.07', deviation: '4' }, { gap: '0.09' }))).toEqual({ kind: 'saved', changed: 2 });
    expect(await set()).toEqual({ gap: 0.07, deviation: 4, factor: 0.3 });
    await setRule(await actor('steward'), 'sample.gap', null, shop('north'));
    expect(await send(form({ gap: '0.06' }, { gap: '0.07' }))).toMatchObject({
      errors: { 'sample.gap': 'This was put back to the usual value in the meantime. Save again to have yours.' },
    });
    // Two who set the same have no quarrel.
    expect(await send(form({ deviation: '4' }))).toEqual({ kind: 'saved', changed: 0 });
  });

  it('does nothing for a form that lost its fields, and nothing for who may not', async () => {
    expect(await send(form({}))).toEqual({ kind: 'saved', changed: 0 });
    await expect(send(new FormData())).rejects.toMatchObject({ status: 400 });
    const file = form({ gap: '1' });
    file.set('value.sample.gap', new Blob(['1']));
    expect(await send(file)).toEqual({ kind: 'saved', changed: 0 });
    await expect(send(form({ gap: '1' }), 'north.editor')).rejects.toMatchObject({ status: 403 });
    await expect(send(form({ gap: '1' }), 'pier.owner')).rejects.toMatchObject({ status: 404 });
    expect(await set()).toMatchObject({ gap: undefined });
  });
});

describe('the rules page', () => {
  const page = async (name: string, asked: string | null = null) => shopOfRulesPage(await actor(name), asked);
  const names = (page: { shops: { name: string }[] }) => page.shops.map(({ name }) => name);

  it('is about the owner’s own shop, and for the steward about any', async () => {
    const owner = await page('pier.owner');
    expect([owner.shop.name, names(owner)]).toEqual(['Test shop pier', ['Test shop pier']]);
    const steward = await page('steward');
    expect([steward.shop.name, names(steward)]).toEqual(['Test shop north', ['Test shop north', 'Test shop pier']]);
    expect((await page('steward', shop('pier'))).shop.name).toBe('Test shop pier');
  });

  it.each(['apprentice', 'technician', 'senior', 'editor'])('is not for an %s', async (role) => {
    await expect(page(`north.${role}`)).rejects.toMatchObject({ status: 403 });
    await expect(page(`north.${role}`, shop('north'))).rejects.toMatchObject({ status: 403 });
    await expect(page(`north.${role}`, shop('pier'))).rejects.toMatchObject({ status: 404 });
  });

  it('is not for those in no shop, and of no shop there is not', async () => {
    for (const name of ['common.editor', 'nobody']) await expect(page(name)).rejects.toMatchObject({ status: 403 });
    for (const asked of ['', 'nowhere', '0190a000-0000-7000-8000-000000000000'])
      for (const name of ['steward', 'north.owner'])
        await expect(page(name, asked)).rejects.toMatchObject({ status: 404 });
    await expect(page('north.owner', shop('pier'))).rejects.toMatchObject({ status: 404 });
  });
});
