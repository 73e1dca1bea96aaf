import type { DeskItem } from '@/domain/api/schemas/proposals';
import { may, type Actor } from '@/domain/people/may';
import { offers } from '@/domain/review/decide';
import { deskOrder } from '@/domain/review/desk';
import { subjectOf } from '@/domain/review/rules';
import { app } from '../context';
import { forbidden } from '../refusal';
import { loadProposals, type Loaded } from './proposals';
import { summaryOf } from './view';

export async function shopsWithOneEditor(): Promise<string[]> {
  const { db } = await app();
  const rows = await db.read<{ shopId: string }>(
    `SELECT shopId FROM memberships WHERE scope = 'shop' AND role = 'editor'
     GROUP BY shopId HAVING count(DISTINCT personId) = 1`,
  );
  return rows.map((row) => row.shopId);
}

/** What this person can do next with a proposal they may review. */
function nextFor(actor: Actor, { facts }: Loaded): DeskItem['next'] {
  const can = offers(actor, facts);
  if (can.publish.ok) return 'publish';
  if (can.agree.ok) return 'agree';
  return can.override.ok ? 'override' : 'wait';
}

/** The proposals that wait for this person's judgement, worst first. Refuses 403 who judges none in any book. */
export async function readDesk(actor: Actor): Promise<DeskItem[]> {
  const permission = may(actor, 'seeReviewDesk', { shopsWithOneEditor: await shopsWithOneEditor() });
  if (!permission.ok) throw forbidden(permission.why);
  const waiting = (await loadProposals(`r.state = 'proposed'`, {})).filter(
    ({ facts }) => may(actor, 'agree', subjectOf(facts)).ok,
  );
  const items = waiting.map((proposal) => ({
    ...summaryOf(proposal),
    proposedAt: proposal.proposedAt ?? proposal.updatedAt,
    next: nextFor(actor, proposal),
  }));
  return deskOrder(items);
}
