import type { Page } from '@/domain/api/schemas/common';
import type { AuditEntry } from '@/domain/api/schemas/history';
import { may, type Actor } from '@/domain/people/may';
import { personColumn, personRef } from '../book/columns';
import { app } from '../context';
import { forbidden, notFound } from '../refusal';

export interface Shop {
  id: string;
  name: string;
}

interface Asked {
  /** `seq` of the last entry of the page before. */
  cursor?: string | undefined;
  limit: number;
  shop?: string | undefined;
}

/** The shops whose entries a person may ask for by themselves. */
export async function shopsToAudit(actor: Actor): Promise<Shop[]> {
  const { db } = await app();
  const shops = await db.read<Shop>('SELECT id, name FROM shops ORDER BY name');
  return shops.filter(({ id }) => may(actor, 'readShopAudit', { shopId: id }).ok);
}

/** The condition on entries `e` that a person may read. Refuses 403 who may read none, 404 a shop that is not theirs to see. */
async function readable(actor: Actor, shop: string | undefined): Promise<{ where: string; shops: string[] }> {
  const shops = await shopsToAudit(actor);
  if (shop !== undefined) {
    if (shops.some(({ id }) => id === shop)) return { where: 'e.shopId IN (:shops)', shops: [shop] };
    const permission = may(actor, 'readShopAudit', { shopId: shop });
    // A shop that is not there is asked for by the steward alone.
    throw permission.ok || !permission.visible ? notFound() : forbidden(permission.why);
  }
  const all = may(actor, 'readAudit', null);
  if (all.ok) return { where: '1', shops: [] };
  if (shops.length === 0) throw forbidden('The audit trail is for the network steward, and of a shop for its owner.');
  return { where: 'e.shopId IN (:shops)', shops: shops.map(({ id }) => id) };
}

interface Row {
  seq: number;
  at: string;
  actor: string | null;
  act: string;
  subjectType: string;
  subjectId: string;
  shopId: string | null;
  shopName: string | null;
  number: string | null;
  letter: string | null;
  detail: string;
  previousHash: string;
  hash: string;
}

/**
 * The audit trail, latest first: all of it for the steward, the entries of their shops for an owner. Refuses 403 everybody
 * else, 404 another's shop.
 */
export async function readAudit(actor: Actor, { cursor, limit, shop }: Asked): Promise<Page<AuditEntry>> {
  const { where, shops } = await readable(actor, shop);
  const { db } = await app();
  const before = cursor !== undefined && /^\d{1,15}$/.test(cursor) ? Number(cursor) : Number.MAX_SAFE_INTEGER;
  const rows = await db.read<Row>(
    `SELECT e.seq, e.at, (SELECT ${personColumn('a')} FROM people a WHERE a.id = e.actorId) AS actor, e.act, e.subjectType,
       e.subjectId, e.shopId, s.name AS shopName, e.detail, e.previousHash, e.hash,
       coalesce(json_extract(e.detail, '$.number'), p.number) AS number, coalesce(r.letter, json_extract(e.detail, '$.letter')) AS letter
     FROM auditEntries e LEFT JOIN shops s ON s.id = e.shopId
     LEFT JOIN revisions r ON e.subjectType = 'revision' AND r.id = e.subjectId
     LEFT JOIN procedures p ON p.id = coalesce(r.procedureId, e.subjectId)
     WHERE e.seq < :before AND ${where} ORDER BY e.seq DESC LIMIT :limit`,
    { before, shops, limit: limit + 1 },
  );
  const items = rows.slice(0, limit).map(entryOf);
  return { items, next: rows.length > limit ? String(items.at(-1)?.seq ?? '') : null };
}

const entryOf = ({ actor, subjectType, subjectId, shopId, shopName, detail, ...row }: Row): AuditEntry => ({
  ...row,
  actor: actor === null ? null : personRef(actor),
  subject: { type: subjectType, id: subjectId },
  shop: shopId === null ? null : { id: shopId, name: shopName ?? '' },
  detail: JSON.parse(detail) as Record<string, unknown>,
});
