import { createHmac } from 'node:crypto';
import { Op } from 'sequelize';
import { app } from '../context';
import { invalid } from '../refusal';

/** What a call answered, as far as it is kept for a second call with the same key. */
export interface Answer {
  status: number;
  headers: Record<string, string>;
  body: string;
}

const KEPT_FOR = 24 * 60 * 60 * 1000;
const running = new Map<string, Promise<Answer>>();

/** The caller's key, or null. Refuses 422 a key that is no plain line of 1 to 200 characters. */
export function idempotencyKey(headers: Headers): string | null {
  const key = headers.get('idempotency-key');
  if (key === null) return null;
  if (!/^[\x21-\x7e]{1,200}$/.test(key))
    throw invalid('Idempotency-Key must be 1 to 200 plain characters without spaces.', [
      { path: 'Idempotency-Key', message: 'must be 1 to 200 plain characters without spaces' },
    ]);
  return key;
}

/**
 * One request as a short text; two are the same where method, path and body are. Keyed with the secret, because it is
 * stored and a body may hold a password.
 */
export const requestPrint = (secret: string, method: string, path: string, body: string) =>
  createHmac('sha256', secret).update(`${method} ${path}\n${body}`).digest('hex');

/**
 * Acts once for each key of a person and answers the same to every repetition within a day, also to one
 * that comes while the first still runs. Only successes are kept: what was refused changed nothing and
 * may be tried again. Where the process dies between the act and keeping its answer, a repetition acts
 * again, and the rules of the act itself (state, version) decide.
 *
 * Refuses 422 where the key was used for another request.
 */
export async function once(
  personId: string,
  key: string,
  print: string,
  act: () => Promise<Answer>,
): Promise<Answer & { replayed: boolean }> {
  const slot = `${personId} ${key} ${print}`;
  const other = running.get(slot);
  if (other) return { ...(await other), replayed: true };
  const work = lookUpOrAct(personId, key, print, act);
  const answer = work.then(({ replayed: _, ...kept }) => kept);
  answer.catch(() => undefined);
  running.set(slot, answer);
  try {
    return await work;
  } finally {
    running.delete(slot);
  }
}

async function lookUpOrAct(personId: string, key: string, print: string, act: () => Promise<Answer>) {
  const { db } = await app();
  const { IdempotencyKey } = db.models;
  const since = new Date(Date.now() - KEPT_FOR).toISOString();
  const [kept] = await db.read<{ request: string; status: number; headers: string; body: string }>(
    `SELECT request, status, headers, body FROM idempotencyKeys
     WHERE personId = :personId AND key = :key AND createdAt > :since`,
    { personId, key, since },
  );
  if (kept && kept.request !== print)
    throw invalid('This Idempotency-Key was used for another request. Make a new key for each request.', [
      { path: 'Idempotency-Key', message: 'was used for another request' },
    ]);
  if (kept)
    return {
      status: kept.status,
      headers: JSON.parse(kept.headers) as Record<string, string>,
      body: kept.body,
      replayed: true,
    };
  const answer = await act();
  await db.write(async () => {
    await IdempotencyKey.destroy({ where: { [Op.or]: [{ createdAt: { [Op.lte]: since } }, { personId, key }] } });
    await IdempotencyKey.create({ personId, key, request: print, ...answer });
  });
  return { ...answer, replayed: false };
}
