import type { DeskItem } from '@/domain/api/schemas/proposals';
import { may, type Actor } from '@/domain/people/may';
import { offer } from '@/domain/review/decide';
import { deskOrder } from '@/domain/review/desk';
import type { DeskRow } from '@/domain/review/deskView';
import { subjectOf, type ProposalFacts } from '@/domain/review/rules';
import { app } from '../context';
import { forbidden } from '../refusal';
import { loadProposals } from './proposals';
import { summaryOf } from './view';
import { readWaiting } from './waiting';

export async function shopsWithOneEditor(): Promise<string[]> {
  const { db } = await app();
  const rows = await db.read<{ shopId: string }>(
    `SELECT shopId FROM memberships WHERE scope = 'shop' AND role = 'editor'
     GROUP BY shopId HAVING count(DISTINCT personId) = 1`,
  );
  return rows.map((row) => row.shopId);
}

/** What this person can do next with a proposal they may review. */
const nextFor = (actor: Actor, facts: ProposalFacts): DeskItem['next'] =>
  (['publish', 'agree', 'override'] as const).find((act) => offer(act, actor, facts).ok) ?? 'wait';

/**
 * The proposals that wait for this person's judgement, worst first, with as much of each as puts it in its place: a desk
 * may hold hundreds, and a page of it shows some. `onDesk` reads the rest. Refuses 403 who judges none in any book.
 */
export async function readDesk(actor: Actor): Promise<DeskRow[]> {
  const permission = may(actor, 'seeReviewDesk', { shopsWithOneEditor: await shopsWithOneEditor() });
  if (!permission.ok) throw forbidden(permission.why);
  const waiting = (await readWaiting()).filter(({ facts }) => may(actor, 'agree', subjectOf(facts)).ok);
  return deskOrder(waiting.map(({ row, facts }) => ({ ...row, next: nextFor(actor, facts) })));
}

/** Proposals of a desk as they are shown, in its order. One that left the desk meanwhile is left out. */
export async function onDesk(actor: Actor, rows: readonly DeskRow[]): Promise<DeskItem[]> {
  const found = await loadProposals(`r.id IN (:ids) AND r.state = 'proposed'`, { ids: rows.map(({ id }) => id) });
  const byId = new Map(found.map((proposal) => [proposal.id, proposal]));
  return rows.flatMap(({ id, proposedAt }) => {
    const proposal = byId.get(id);
    return proposal ? [{ ...summaryOf(proposal), proposedAt, next: nextFor(actor, proposal.facts) }] : [];
  });
}
