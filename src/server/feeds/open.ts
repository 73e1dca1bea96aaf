import type { Actor } from '@/domain/people/may';
import { whoIs } from '../accounts/whoIs';
import { app } from '../context';
import { notFound } from '../refusal';
import { keyHashOf } from './keys';
import { countFetch, countMiss } from './limits';
import { mayHaveFeed, type FeedShop } from './places';

export interface OpenedFeed {
  id: string;
  shopId: FeedShop;
  madeAt: string;
  /** Whose feed it is, with the roles they hold now. */
  actor: Actor;
}

interface Row {
  id: string;
  shopId: FeedShop;
  madeAt: string;
  personId: string;
  tokenVersion: number;
}

const KEY = /^[A-Za-z0-9_-]{43}$/;

/**
 * The feed that a key opens. Refuses 404 a key that is unknown, revoked, or of somebody who may no longer have the feed,
 * all alike; 429 what is asked for too often.
 *
 * @param address of whoever asks, for counting what was not found
 */
export async function openFeed(key: string, address: string): Promise<OpenedFeed> {
  const opened = KEY.test(key) ? await find(key) : null;
  if (!opened) {
    await countMiss(address);
    throw notFound();
  }
  await countFetch(opened.id);
  return opened;
}

async function find(key: string): Promise<OpenedFeed | null> {
  const { db } = await app();
  const [row] = await db.read<Row>(
    `SELECT f.id, f.shopId, f.madeAt, f.personId, p.tokenVersion FROM feedKeys f JOIN people p ON p.id = f.personId
     WHERE f.keyHash = :keyHash`,
    { keyHash: keyHashOf(key) },
  );
  // The key stands for the person, not for a session: whoever may not sign in any more has no feed either.
  const who = row && (await whoIs(row));
  if (!who || !mayHaveFeed(who.actor, row.shopId)) return null;
  const { id, shopId, madeAt } = row;
  return { id, shopId, madeAt, actor: who.actor };
}
