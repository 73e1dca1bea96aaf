import { Auth } from '@auth/core';
import { beforeEach, describe, expect, test } from 'vitest';
import { seedNetwork } from '@db/seeders/seedNetwork';
import { authConfig } from '@/server/accounts/authConfig';
import { checkSignIn } from '@/server/accounts/checkSignIn';
import { demonstrationPeople } from '@/server/accounts/demonstration';
import { hashPassword } from '@/server/accounts/passwords';
import { changePassword, saveProfile, setCurrentShop, signOutEverywhere } from '@/server/accounts/profile';
import { newSession, readSession } from '@/server/accounts/session';
import { csrfFor, signInProblem } from '@/server/accounts/signInPage';
import { fromAddress, TRIES_BY_ACCOUNT, TRIES_BY_ADDRESS } from '@/server/accounts/tries';
import { whoIs } from '@/server/accounts/whoIs';
import { useApp, type App } from '@/server/context';
import { openTestBook } from '../../setup/database';

const PASSWORD = 'a long enough password';
let running: App;
let count = 0;
/** Tries are counted for the process, so each test has an account of its own. */
let email: string;
let personId: string;

beforeEach(async () => {
  running = await openTestBook();
  email = `person${++count}@test.example`;
  const person = await running.db.models.Person.create({
    email,
    name: 'Person',
    passwordHash: await hashPassword(PASSWORD),
  });
  personId = person.id;
});

let address = 0;
const elsewhere = <T>(fn: () => Promise<T>) => fromAddress(`192.0.2.${++address}`, fn);
const enter = (password = PASSWORD) => elsewhere(() => checkSignIn(email, password));
const actor = () => ({ personId, memberships: [] });

/** The whole way of a browser: the page's token, then the form. */
async function post(fields: Record<string, string>, withCookie = true) {
  const { config, secret } = running;
  const page = await csrfFor(new Request('http://book.test/sign-in'));
  const cookie = page.setCookies.map((line) => line.split(';')[0]).join('; ');
  const response = await Auth(
    new Request('http://book.test/api/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded', ...(withCookie ? { cookie } : {}) },
      body: new URLSearchParams({ csrfToken: page.token, ...fields }),
    }),
    authConfig(config, secret),
  );
  const cookies = new Map(response.headers.getSetCookie().map((line) => line.split(/[=;]/, 2) as [string, string]));
  return { response, session: cookies.get('matchmark.session'), location: response.headers.get('location') ?? '' };
}

describe('signing in', () => {
  test('gives a session that stands for the person, with nothing in the clear', async () => {
    const { response, session, location } = await elsewhere(() =>
      post({ email: ` ${email.toUpperCase()} `, password: PASSWORD, callbackUrl: '/procedures/P-0142' }),
    );
    expect(location).toBe('http://book.test/procedures/P-0142');
    const line = response.headers.getSetCookie().find((c) => c.startsWith('matchmark.session'));
    expect(line).toMatch(/HttpOnly/);
    expect(line).toMatch(/SameSite=Lax/);
    expect(session).not.toContain(personId);
    expect(await readSession(session)).toMatchObject({ personId, tokenVersion: 1 });
  });

  test.each([
    ['a wrong password', () => ({ email, password: 'another password' })],
    ['an unknown address', () => ({ email: 'nobody@test.example', password: PASSWORD })],
    ['an endless password', () => ({ email, password: 'x'.repeat(100_000) })],
    ['no password', () => ({ email })],
  ] as [string, () => Record<string, string>][])('is refused in the same words with %s', async (_, fields) => {
    const { session, location } = await elsewhere(() => post(fields()));
    expect(session).toBeUndefined();
    expect(location).toBe('http://book.test/sign-in?error=CredentialsSignin&code=wrong');
    expect(signInProblem(new URL(location))).toBe('The e-mail address and the password do not belong together.');
  });

  test('is refused without the token of our own page', async () => {
    const { session, location } = await elsewhere(() => post({ email, password: PASSWORD }, false));
    expect(session).toBeUndefined();
    expect(location).toContain('error=MissingCSRF');
  });

  test('never sends anybody to another site', async () => {
    const { location } = await elsewhere(() => post({ email, password: PASSWORD, callbackUrl: 'https://other.test/' }));
    expect(new URL(location).origin).toBe('http://book.test');
  });

  test('stores an argon2id hash with a salt of its own', async () => {
    const [one, two] = await Promise.all([hashPassword(PASSWORD), hashPassword(PASSWORD)]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(one).not.toBe(two);
  });

  test('stops after too many wrong passwords for one account, the right one too, wherever they come from', async () => {
    for (let i = 0; i < TRIES_BY_ACCOUNT; i++) expect(await enter('wrong password')).toBeNull();
    await expect(enter()).rejects.toMatchObject({
      status: 429,
      headers: { 'Retry-After': expect.stringMatching(/^\d+$/) },
    });
    const { location } = await elsewhere(() => post({ email, password: PASSWORD }));
    expect(signInProblem(new URL(location))).toMatch(/^Too many wrong passwords\./);
  });

  test('stops after too many from one address, and not for others', async () => {
    await fromAddress('198.51.100.9', async () => {
      await Promise.all(
        Array.from({ length: TRIES_BY_ADDRESS }, (_, i) => checkSignIn(`spray${i}@test.example`, 'guess')),
      );
      await expect(checkSignIn(email, PASSWORD)).rejects.toMatchObject({ status: 429 });
    });
    expect(await enter()).toMatchObject({ personId });
  });

  test('right passwords do not count, however many', async () => {
    await fromAddress('198.51.100.10', async () => {
      for (let i = 0; i < TRIES_BY_ADDRESS + 2; i++) expect(await checkSignIn(email, PASSWORD)).not.toBeNull();
    });
  });
});

describe('a session', () => {
  const session = async () => (await newSession({ personId, tokenVersion: 1 })).value;

  test('ends everywhere when the person says so', async () => {
    const cookie = await session();
    expect(await whoIs((await readSession(cookie))!)).not.toBeNull();
    await signOutEverywhere(actor());
    expect(await whoIs((await readSession(cookie))!)).toBeNull();
  });

  test('ends when the password changes, and the browser that changed it can have a new one', async () => {
    const old = await session();
    const next = await elsewhere(() => changePassword(actor(), { current: PASSWORD, next: 'an even longer one' }));
    expect(await whoIs((await readSession(old))!)).toBeNull();
    const renewed = await readSession((await newSession(next)).value);
    expect((await whoIs(renewed!))?.me.id).toBe(personId);
    expect(await enter()).toBeNull();
    expect(await enter('an even longer one')).not.toBeNull();
  });

  test('reads roles and shop as they stand at each request', async () => {
    const { Membership, Shop } = running.db.models;
    const known = (await readSession(await session()))!;
    expect((await whoIs(known))?.actor.memberships).toEqual([]);
    const [a, b] = [await Shop.create({ name: 'A shop' }), await Shop.create({ name: 'B shop' })];
    const role = await Membership.create({ personId, scope: 'shop', shopId: a.id, role: 'editor' });
    await Membership.create({ personId, scope: 'shop', shopId: b.id, role: 'technician' });
    const who = await whoIs(known);
    expect(who?.me.roles.map((r) => `${r.name}: ${r.role}`)).toEqual(['A shop: editor', 'B shop: technician']);
    await setCurrentShop(who!.actor, b.id);
    expect((await whoIs(known))?.me.shop?.name).toBe('B shop');
    await expect(setCurrentShop(who!.actor, 'another')).rejects.toMatchObject({ status: 404 });
    await role.destroy();
    expect((await whoIs(known))?.actor.memberships).toEqual([{ in: 'shop', shopId: b.id, role: 'technician' }]);
  });

  test.each([
    ['nothing', async () => undefined],
    ['a forged cookie', async () => `${(await session()).slice(0, -4)}AAAA`],
    [
      'a cookie of another server',
      async () => {
        const cookie = await session();
        useApp({ ...running, secret: 'f'.repeat(64) });
        return cookie;
      },
    ],
  ] as [string, () => Promise<string | undefined>][])('is not made of %s', async (_, cookie) => {
    expect(await readSession(await cookie())).toBeNull();
  });
});

test('where the address is https the cookie is sent over it only, and one given before is not taken', async () => {
  const plain = (await newSession({ personId, tokenVersion: 1 })).value;
  useApp({ ...running, config: { ...running.config, origin: 'https://book.example' } });
  const { name, value, options } = await newSession({ personId, tokenVersion: 1 });
  expect(name).toBe('__Secure-matchmark.session');
  expect(options).toMatchObject({ secure: true, httpOnly: true, sameSite: 'lax' });
  expect(await readSession(value)).toMatchObject({ personId });
  expect(await readSession(plain)).toBeNull();
  const config = authConfig({ ...running.config, origin: 'https://book.example' }, running.secret);
  expect(config.cookies.sessionToken).toEqual({ name, options });
});

describe('the profile', () => {
  test('takes a name and units, and says which field is wrong', async () => {
    await saveProfile(actor(), { name: '  New Name ', units: 'inch' });
    expect(await running.db.models.Person.findByPk(personId)).toMatchObject({ name: 'New Name', units: 'inch' });
    await expect(saveProfile(actor(), { name: ' ' })).rejects.toMatchObject({
      status: 422,
      errors: [{ path: 'name', message: 'Write your name.' }],
    });
    await expect(saveProfile(actor(), { units: 'cubits' })).rejects.toMatchObject({ status: 422 });
  });

  test('refuses a short password and a wrong present one', async () => {
    const change = (current: string, next: string) => elsewhere(() => changePassword(actor(), { current, next }));
    await expect(change(PASSWORD, 'short')).rejects.toMatchObject({ errors: [{ path: 'next' }] });
    await expect(change('not my password', 'long enough too')).rejects.toMatchObject({ errors: [{ path: 'current' }] });
  });
});

describe('the demonstration', () => {
  const seed = () => seedNetwork(running.db, () => hashPassword('matchmark-demo'));

  test('offers its people, who sign in while DEMO is set', async () => {
    useApp({ ...running, config: { ...running.config, demo: true } });
    await seed();
    const people = await demonstrationPeople();
    expect(new Set(people.map((p) => p.name)).size).toBe(people.length);
    expect(people.map((p) => p.role)).toEqual(
      expect.arrayContaining(['Apprentice', 'Second editor', 'Network steward']),
    );
    for (const { email: who, password } of people)
      expect(await elsewhere(() => checkSignIn(who, password)), who).not.toBeNull();
  });

  test('is loaded once, and leaves alone what people made of it', async () => {
    await seed();
    const { Person } = running.db.models;
    await Person.update({ name: 'Renamed' }, { where: { email: 'editor@halden.example' } });
    const before = await Person.count();
    await seed();
    expect(await Person.count()).toBe(before);
    expect((await Person.findOne({ where: { email: 'editor@halden.example' } }))?.name).toBe('Renamed');
  });

  test('without DEMO nobody of it signs in, and a session they had is over', async () => {
    await seed();
    expect(await demonstrationPeople()).toEqual([]);
    expect(await elsewhere(() => checkSignIn('steward@halden.example', 'matchmark-demo'))).toBeNull();
    const steward = await running.db.models.Person.findOne({ where: { email: 'steward@halden.example' } });
    expect(await whoIs({ personId: steward!.id, tokenVersion: 1 })).toBeNull();
  });
});
