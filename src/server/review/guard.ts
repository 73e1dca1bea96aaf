import { may, type Actor } from '@/domain/people/may';
import { decide, type Decision, type ProposalAct } from '@/domain/review/decide';
import { unfinishedReason } from '@/domain/review/restore';
import { isStale, staleWords, subjectOf, type ProposalFacts } from '@/domain/review/rules';
import { conflict, notFound, refusalOf, stale } from '../refusal';
import { loadProposal, type Loaded } from './proposals';

type Accepted = Extract<Decision, { ok: true }>;

/** The proposal, if this person may read it; 404 for an unknown and an unseen one alike. */
export async function readableProposal(actor: Actor, id: string): Promise<Loaded> {
  const found = await loadProposal(id);
  if (!found || !may(actor, 'readProposal', subjectOf(found.facts)).ok) throw notFound();
  return found;
}

/** What a caller who lost a race needs to go on: nothing of theirs was stored, nothing of the other's was touched. */
const standing = ({ version, state, base, current }: Loaded) => ({ version, state, base, current });

const CHANGED_UNDER_AUTHOR = (again: string) =>
  `This proposal was changed elsewhere after you opened it. Nothing was overwritten and nothing you typed was lost: open it again, compare, and ${again} once more.`;
const CHANGED_UNDER_REVIEWER =
  'This proposal was changed after you opened it, so what stands now may be another text than the one you judged. Nothing was done, and a reason that you wrote is kept: open it again and judge what stands there.';

/** An author goes on with what they typed; a reviewer must see the new text first. */
const CHANGED: Record<ProposalAct['act'], string> = {
  edit: CHANGED_UNDER_AUTHOR('save'),
  submit: CHANGED_UNDER_AUTHOR('send it in'),
  return: CHANGED_UNDER_REVIEWER,
  decline: CHANGED_UNDER_REVIEWER,
  agree: CHANGED_UNDER_REVIEWER,
  override: CHANGED_UNDER_REVIEWER,
  publish: CHANGED_UNDER_REVIEWER,
};

/** Refuses 409 where the caller's version is not the one that stands. null says nothing and passes. */
function expectVersion(act: ProposalAct['act'], proposal: Loaded, version: number | null): void {
  if (version === null || version === proposal.version) return;
  throw stale(CHANGED[act], standing(proposal));
}

/** A published letter that the text does not stand on is a lost race, told with the letter that won it. */
export const staleBase = (facts: Pick<ProposalFacts, 'base' | 'current'>, extra: Record<string, unknown> = {}) =>
  stale(`${staleWords(facts)} Nothing was lost.`, { base: facts.base, current: facts.current, ...extra });

/** The field of the call that an `invalid` is about. */
function missingField(what: ProposalAct, { identical, reason, failing }: ProposalFacts): string {
  if (what.act === 'override') return failing.some(({ key }) => key === what.torque) ? 'reason' : 'torque';
  return what.act === 'submit' && identical && reason.trim() && !unfinishedReason(reason) ? 'source' : 'reason';
}

/**
 * Asks the rules of review. Refuses 404 and 403 first, then 409 for another version, then what the rules
 * themselves say: 422 for something left out, 409 for a base, a state or agreements that do not allow it.
 */
export function guard(
  what: ProposalAct,
  actor: Actor,
  proposal: Loaded,
  version: number | null,
  facts: ProposalFacts = proposal.facts,
): Accepted {
  const decision = decide(what, actor, facts);
  if (!decision.ok && (decision.kind === 'hidden' || decision.kind === 'forbidden')) throw refusalOf(decision);
  expectVersion(what.act, proposal, version);
  if (decision.ok) return decision;
  if (decision.kind === 'invalid') throw refusalOf(decision, missingField(what, facts));
  if (isStale(facts) && decision.why === staleWords(facts)) throw staleBase(facts, standing(proposal));
  throw conflict(decision.why, standing(proposal));
}
