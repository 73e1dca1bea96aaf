import { expect, it } from 'vitest';
import { hashPassword, verifyPassword } from '@/server/accounts/passwords';
import { readSession } from '@/server/accounts/session';
import { app } from '@/server/context';
import { call } from './support/call';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();

it('says who I am, with my roles and my shop', async () => {
  expect((await call(who('north.senior'), 'GET', '/me')).body).toMatchObject({
    name: 'north senior',
    units: 'metric',
    shop: { id: shop('north'), name: 'Test shop north' },
    roles: [{ in: 'shop', shopId: shop('north'), role: 'senior', name: 'Test shop north' }],
  });
});

it('changes my name and my units, one at a time or both', async () => {
  const person = who('north.senior');
  expect((await call(person, 'PATCH', '/me', { body: { units: 'inch' } })).body).toMatchObject({ units: 'inch' });
  await call(person, 'PATCH', '/me', { body: { name: '  Another Name ' } });
  expect((await call(person, 'GET', '/me')).body).toMatchObject({ name: 'Another Name', units: 'inch' });
});

it('switches single-key shortcuts off and on; they are on at first', async () => {
  const person = who('north.senior');
  const shortcuts = async () => (await call(person, 'GET', '/me')).body;
  expect(await shortcuts()).toMatchObject({ shortcuts: true });
  expect((await call(person, 'PATCH', '/me', { body: { shortcuts: false } })).body).toMatchObject({ shortcuts: false });
  await call(person, 'PATCH', '/me', { body: { units: 'inch' } });
  expect(await shortcuts()).toMatchObject({ shortcuts: false, units: 'inch' });
  await call(person, 'PATCH', '/me', { body: { shortcuts: true } });
  expect(await shortcuts()).toMatchObject({ shortcuts: true });
});

it.each([
  [{ units: 'cubits' }, 'units', 'must be one of metric, inch'],
  [{ name: '   ' }, 'name', 'must not be empty'],
  [{ name: 7 }, 'name', 'must be text'],
  [{ shortcuts: 'off' }, 'shortcuts', 'must be true or false'],
])('refuses %j', async (body, path, message) => {
  const answer = await call(who('north.senior'), 'PATCH', '/me', { body });
  expect(answer).toMatchObject({ status: 422, body: { errors: [{ path, message }] } });
});

it.each(['two\nlines', 'a\0b', 'read \u202ebackwards'])(
  'refuses a name that does not read as it is stored: %j',
  async (name) => {
    const answer = await call(who('north.senior'), 'PATCH', '/me', { body: { name } });
    expect(answer).toMatchObject({ status: 422, body: { errors: [{ path: 'name' }] } });
    expect((await call(who('north.senior'), 'GET', '/me')).body).toMatchObject({ name: 'north senior' });
  },
);

it('keeps in the audit trail what I was called, and nothing where my name stays', async () => {
  const person = who('north.senior');
  await call(person, 'PATCH', '/me', { body: { name: 'north senior', units: 'inch' } });
  await call(person, 'PATCH', '/me', { body: { name: 'Another Name' } });
  const { db } = await app();
  const trail = await db.read<{ detail: string }>(`SELECT detail FROM auditEntries WHERE act = 'person.renamed'`);
  expect(trail.map(({ detail }) => JSON.parse(detail) as unknown)).toEqual([
    { from: 'north senior', to: 'Another Name' },
  ]);
});

it('changes my password, ends my other sessions and gives this one a new cookie', async () => {
  const person = who('north.senior');
  const { db } = await app();
  const row = (await db.models.Person.findByPk(person.id))!;
  await row.update({ passwordHash: await hashPassword('the first password') });
  const wrong = await call(person, 'POST', '/me/password', {
    body: { current: 'another', next: 'the second password' },
  });
  expect(wrong).toMatchObject({ status: 422, body: { errors: [{ path: 'current' }] }, cookies: {} });
  const changed = await call(person, 'POST', '/me/password', {
    body: { current: 'the first password', next: 'the second password' },
  });
  expect(changed).toMatchObject({ status: 204, body: null });
  await row.reload();
  expect(await verifyPassword(row.passwordHash!, 'the second password')).toBe(true);
  expect(await readSession(Object.values(changed.cookies)[0])).toMatchObject({
    personId: person.id,
    tokenVersion: row.tokenVersion,
  });
  expect(row.tokenVersion).toBe(2);
});

it('signs me out everywhere', async () => {
  const person = who('north.senior');
  const answer = await call(person, 'POST', '/me/sign-out-everywhere');
  expect(answer.status).toBe(204);
  expect(answer.headers.get('clear-site-data')).toBe('"cache"');
  const { db } = await app();
  expect((await db.models.Person.findByPk(person.id))!.tokenVersion).toBe(2);
});
