import type { Page } from '@/domain/api/schemas/common';
import type { AuditEntry } from '@/domain/api/schemas/history';
import type { Fault } from '@/domain/audit/fault';
import { may, type Actor } from '@/domain/people/may';
import { knownTrail } from './known';
import { readAudit, shopsToAudit, type Shop } from './read';

const AT_A_TIME = 50;

export interface AuditPage {
  entries: Page<AuditEntry>;
  /** Shops to choose from, and the one that was chosen; null for all that the reader may see. */
  shops: Shop[];
  shop: Shop | null;
  /** How the whole trail stands; for the steward. */
  trail: { entries: number; wholeAt: string; faults: Fault[] } | null;
}

/** The page of the audit trail. Refuses like `readAudit`. */
export async function readAuditPage(
  actor: Actor,
  { before, shop }: { before: string | null; shop: string | null },
): Promise<AuditPage> {
  const entries = await readAudit(actor, { cursor: before ?? undefined, limit: AT_A_TIME, shop: shop ?? undefined });
  const shops = await shopsToAudit(actor);
  const known = may(actor, 'readAudit', null).ok ? await knownTrail() : null;
  return {
    entries,
    shops,
    shop: shops.find(({ id }) => id === shop) ?? null,
    trail: known && { entries: known.end.seq, wholeAt: known.wholeAt, faults: known.faults },
  };
}
