import { z } from 'zod';
import { atomFeed } from '@/domain/feed/atom';
import { app } from '../context';
import { notFound } from '../refusal';
import { listEvents } from './events';
import { openFeed } from './open';

export const USUAL_LIMIT = 50;

const Page = z.object({
  limit: z.coerce.number().int().min(1).max(200).catch(USUAL_LIMIT),
  before: z.string().uuid().nullable(),
});

/** The page of a feed that an address asks for. Refuses 404 an unknown key and an unknown place in it; 429. */
export async function readFeed(key: string, url: URL, address: string): Promise<string> {
  const { config } = await app();
  const { id, shopId, madeAt, actor } = await openFeed(key, address);
  const asked = Page.safeParse({
    limit: url.searchParams.get('limit') ?? USUAL_LIMIT,
    before: url.searchParams.get('before'),
  });
  if (!asked.success) throw notFound();
  const { limit, before } = asked.data;
  // One more than asked for tells whether there is a next page.
  const found = await listEvents(actor, shopId, { before, limit: limit + 1 });
  if (!found) throw notFound();
  const entries = found.slice(0, limit);
  const origin = config.origin ?? url.origin;
  const page = (last: string | null) => {
    const query = new URLSearchParams({
      ...(limit !== USUAL_LIMIT && { limit: String(limit) }),
      ...(last !== null && { before: last }),
    });
    return `${origin}/feed/${key}.atom${query.size ? `?${query.toString()}` : ''}`;
  };
  const [latest] = before === null ? entries : ((await listEvents(actor, shopId, { before: null, limit: 1 })) ?? []);
  return atomFeed({
    id,
    title: await titleOf(shopId),
    updated: latest?.at ?? madeAt,
    origin,
    self: page(before),
    first: page(null),
    next: found.length > limit ? page(entries.at(-1)?.id ?? null) : null,
    entries,
  });
}

async function titleOf(shopId: string | null): Promise<string> {
  if (shopId === null) return 'Matchmark: common book';
  const { db } = await app();
  const [shop] = await db.read<{ name: string }>('SELECT name FROM shops WHERE id = :shopId', { shopId });
  return `Matchmark: common book and ${shop?.name ?? 'your shop'}`;
}
