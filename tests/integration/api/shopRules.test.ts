import { describe, expect, it, vi } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { FILLED } from '../../factories/sampleWorksheet';
import { call } from './support/call';
import { useNetwork } from './support/useNetwork';

vi.mock('@/domain/worksheets/registry', () => import('../../factories/registryWithSample'));

const { who, shop } = useNetwork();
const GAP = '/shop/rules/sample.gap';

const put = (name: string, path: string, value: unknown) => call(who(name), 'PUT', path, { body: { value } });

/** What the sample worksheet goes by for somebody. */
async function goesBy(name: string): Promise<Record<string, number>> {
  const { status, body } = await call(who(name), 'POST', '/worksheets/sample', { body: FILLED });
  expect(status).toBe(200);
  const results = body.results as { key: string; value: number }[];
  return Object.fromEntries(results.map(({ key, value }) => [key, value]));
}
const ruleOf = async (name: string, rule: string, path = '/shop/rules') => {
  const { body } = await call(who(name), 'GET', path);
  return (body.items as { name: string }[]).find((one) => one.name === rule);
};
const trail = async () => {
  const { db } = await app();
  const rows = await db.read<{ act: string; shopId: string; detail: string }>(
    `SELECT act, shopId, detail FROM auditEntries WHERE act LIKE 'shop.rule%' ORDER BY seq`,
  );
  return rows.map(({ detail, ...row }) => ({ ...row, detail: JSON.parse(detail) as unknown }));
};

describe('the rules of thumb of a shop', () => {
  it('stand at what is usual until the owner sets one, and then in every worksheet of that shop only', async () => {
    const usual = { deviation: 3, gap: 0.05e-3, factor: 0.2 };
    expect(await goesBy('north.apprentice')).toEqual(usual);
    expect((await put('north.owner', GAP, '2 thou')).body).toMatchObject({
      name: 'sample.gap',
      worksheet: 'sample',
      field: 'gap',
      label: 'Gap allowed',
      unit: 'mm',
      usual: 0.05,
      set: 0.0508,
      setBy: { id: who('north.owner').id, name: 'north owner' },
      above: 0,
    });
    for (const name of ['north.apprentice', 'north.senior', 'north.owner'])
      expect((await goesBy(name))['gap']).toBeCloseTo(0.0508e-3, 12);
    for (const name of ['pier.owner', 'common.editor', 'steward', 'nobody'])
      expect(await goesBy(name), name).toEqual(usual);
    // What somebody fills in stands above what the shop has set.
    const { body } = await call(who('north.apprentice'), 'POST', '/worksheets/sample', { body: { ...FILLED, gap: 1 } });
    expect(body.results).toContainEqual(expect.objectContaining({ key: 'gap', value: 0.001 }));
  });

  it.each([null, '', '  '])('go back to what is usual with %j', async (value) => {
    await put('north.owner', GAP, 0.08);
    expect((await put('north.owner', GAP, value)).body).toMatchObject({ set: null, setBy: null, setAt: null });
    expect((await goesBy('north.senior'))['gap']).toBeCloseTo(0.05e-3, 12);
  });

  it('are read by the shop and set by its owner and the steward; to others they are not there', async () => {
    const table: [name: string, get: number, set: number][] = [
      ['north.apprentice', 200, 403],
      ['north.technician', 200, 403],
      ['north.senior', 200, 403],
      ['north.editor', 200, 403],
      ['north.owner', 200, 200],
      ['pier.owner', 404, 404],
      ['common.editor', 404, 404],
      ['steward', 200, 200],
      ['nobody', 404, 404],
    ];
    const of = `?shop=${shop('north')}`;
    for (const [name, get, set] of table) {
      expect((await call(who(name), 'GET', `/shop/rules${of}`)).status, `${name} reads`).toBe(get);
      expect((await put(name, GAP + of, 0.08)).status, `${name} sets`).toBe(set);
    }
    for (const name of ['common.editor', 'steward', 'nobody']) {
      expect((await call(who(name), 'GET', '/shop/rules')).status, name).toBe(404);
      expect((await put(name, GAP, 0.08)).status, name).toBe(404);
    }
    expect((await call(null, 'GET', '/shop/rules')).status).toBe(401);
    expect((await call(null, 'PUT', GAP, { body: { value: 1 } })).status).toBe(401);
    const nowhere = '?shop=0190a000-0000-7000-8000-000000000000';
    expect((await call(who('steward'), 'GET', `/shop/rules${nowhere}`)).status).toBe(404);
    expect((await put('steward', GAP + nowhere, 1)).status).toBe(404);
  });

  it.each<[unknown, string]>([
    ['wide', 'Gap allowed: "wide" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['1,250', 'Gap allowed: "1,250" can be read in two ways. Write 1250 or 1.250.'],
    [0, 'Gap allowed must be more than zero.'],
    ['4 %', 'Gap allowed: % measures share, and here goes length, for example in mm.'],
  ])('refuse %j in words, and stay as they are', async (value, message) => {
    await put('north.owner', GAP, 0.08);
    expect(await put('north.owner', GAP, value)).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'value', message }] },
    });
    expect(await ruleOf('north.owner', 'sample.gap')).toMatchObject({ set: 0.08 });
  });

  it('are none by another name, and take one value only', async () => {
    for (const name of ['sample.depth', 'sample.side', 'sample.__proto__', 'gap', 'units.measure'])
      expect((await put('north.owner', `/shop/rules/${name}`, 1)).status, name).toBe(404);
    for (const body of [{}, { value: true }, { value: [1] }, { value: 1, also: 2 }, { value: '1'.repeat(61) }])
      expect((await call(who('north.owner'), 'PUT', GAP, { body })).status, JSON.stringify(body)).toBe(422);
  });

  it('leave one entry in the trail for each change, with what it was before', async () => {
    await put('north.owner', GAP, 0.08);
    await put('north.owner', GAP, '0.08 mm');
    await put('steward', `${GAP}?shop=${shop('north')}`, 0.1);
    await put('north.owner', GAP, null);
    await put('north.owner', GAP, null);
    await put('north.owner', GAP, 'wide');
    await put('north.apprentice', GAP, 1);
    const entry = (act: string, from: number | null, to: number | null) => ({
      act,
      shopId: shop('north'),
      detail: { rule: 'sample.gap', from, to, usual: 0.05, unit: 'mm' },
    });
    expect(await trail()).toEqual([
      entry('shop.rule-set', null, 0.08),
      entry('shop.rule-set', 0.08, 0.1),
      entry('shop.rule-cleared', 0.1, null),
    ]);
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('that no longer fit their field are as if they had not been set, and can be set anew', async () => {
    const { db } = await app();
    const row = { shopId: shop('north'), setById: who('north.owner').id };
    await db.models.ShopRule.create({ ...row, name: 'sample.deviation', value: 99 });
    await db.models.ShopRule.create({ ...row, name: 'sample.gone', value: 1 });
    expect((await goesBy('north.senior'))['deviation']).toBe(3);
    expect(await ruleOf('north.owner', 'sample.deviation')).toMatchObject({ set: null });
    expect((await put('north.owner', '/shop/rules/sample.deviation', 5)).body).toMatchObject({ set: 5 });
    expect((await goesBy('north.senior'))['deviation']).toBe(5);
  });

  it('are those of the shop that somebody works in now', async () => {
    const { db } = await app();
    const person = who('north.technician');
    await db.models.Membership.create({ personId: person.id, scope: 'shop', shopId: shop('pier'), role: 'technician' });
    await put('pier.owner', GAP, 0.09);
    expect((await goesBy('north.technician'))['gap']).toBeCloseTo(0.05e-3, 12);
    await db.models.Person.update({ currentShopId: shop('pier') }, { where: { id: person.id } });
    expect((await goesBy('north.technician'))['gap']).toBeCloseTo(0.09e-3, 12);
    expect((await call(person, 'GET', '/shop/rules')).body.shop).toEqual({ id: shop('pier'), name: 'Test shop pier' });
    expect((await call(person, 'GET', '/me')).body.shop.id).toBe(shop('pier'));
  });
});
