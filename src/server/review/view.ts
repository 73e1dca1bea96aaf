import type { PersonRef } from '@/domain/api/schemas/common';
import type { Proposal, ProposalSummary } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { offers, type ProposalAct } from '@/domain/review/decide';
import { standingOverride } from '@/domain/review/overrides';
import { agreementsNeeded, isStale, standing, tally } from '@/domain/review/rules';
import { bookRef, personColumn, personRef } from '../book/columns';
import { app } from '../context';
import { evidenceOf } from '../photos/evidence';
import { originOf } from './origin';
import type { Listed, Loaded } from './proposals';
import { trailOf } from './trail';

/** The title as far as the text can be read; a draft may be broken anywhere. */
const titleOf = ({ head, parentTitle, source }: Listed): string =>
  head?.title ?? parentTitle ?? (/^title:[ \t]*(\S.{0,89})/m.exec(source ?? '')?.[1]?.trim() || 'Untitled');

const OPEN = new Set(['draft', 'proposed', 'returned']);

export function summaryOf(proposal: Listed): ProposalSummary {
  const { facts, criticalReasons, takesBack, severity } = proposal;
  return {
    id: proposal.id,
    number: proposal.number,
    title: titleOf(proposal),
    book: bookRef(proposal),
    state: proposal.state,
    version: proposal.version,
    base: proposal.base,
    stale: OPEN.has(proposal.state) && isStale(facts),
    author: personRef(proposal.author),
    reason: proposal.reason,
    critical: criticalReasons.length > 0,
    criticalReasons: [...criticalReasons],
    takesBack,
    severity,
    agreementsNeeded: agreementsNeeded(criticalReasons),
    agreements: tally(facts).given,
    createdAt: proposal.createdAt,
    updatedAt: proposal.updatedAt,
    proposedAt: proposal.proposedAt,
  };
}

interface RemarkRow {
  id: string;
  kind: 'returned' | 'declined';
  person: string;
  at: string;
  text: string;
  anchor: string | null;
}

/** Torques that fail the clamp check, each with the override that stands or, once it was published, stood. */
function failingOf({ facts, overrides }: Loaded, personOf: (id: string) => PersonRef): Proposal['failing'] {
  const isOver = facts.state === 'published' || facts.state === 'superseded';
  return facts.failing.map((torque) => {
    const given = overrides.filter((o) => o.hash === facts.hash && o.torque === torque.key);
    // Who has overridden a published text answers for it still, whatever became of their role.
    const standing = isOver ? given[0] : standingOverride(facts, torque.key);
    const stood = given.find((o) => o.personId === standing?.personId);
    return {
      ...torque,
      override: stood ? { person: personOf(stood.personId), reason: stood.reason, at: stood.at } : null,
    };
  });
}

/** A proposal as its author and its reviewers see it, with what this person may do with it and why not. */
export async function proposalOf(actor: Actor, proposal: Loaded): Promise<Proposal> {
  const { db } = await app();
  const remarks = await db.read<RemarkRow>(
    `SELECT m.id, m.kind, m.at, m.text, m.anchor, ${personColumn('a')} AS person
     FROM remarks m JOIN people a ON a.id = m.personId WHERE m.revisionId = :id ORDER BY m.at, m.id`,
    { id: proposal.id },
  );
  const people = await db.read<{ id: string; person: string }>(
    `SELECT a.id, ${personColumn('a')} AS person FROM people a
     WHERE a.id IN (SELECT personId FROM agreements WHERE revisionId = :id
       UNION SELECT personId FROM clampOverrides WHERE revisionId = :id)`,
    { id: proposal.id },
  );
  const personOf = (id: string) => personRef(people.find((p) => p.id === id)?.person ?? 'null');
  const origin = await originOf(actor, proposal);
  const { facts } = proposal;
  const { editors, standIns } = standing(facts);
  const stands = new Set([...editors, ...standIns]);
  const can = offers(actor, facts);
  const acts = Object.keys(can) as ProposalAct['act'][];
  return {
    ...summaryOf(proposal),
    source: proposal.source,
    photos: await evidenceOf(actor, proposal),
    origin,
    agreed: proposal.given.map((g) => ({
      person: personOf(g.personId),
      at: g.at,
      stands: stands.has(g.personId) && g.hash === facts.hash && g.base === facts.base,
    })),
    failing: failingOf(proposal, personOf),
    remarks: remarks.map(({ person, ...remark }) => ({ ...remark, person: personRef(person) })),
    trail: await trailOf(proposal.id),
    currentLetter: proposal.current,
    publishedLetter: proposal.letter,
    may: Object.fromEntries(acts.map((act) => [act, can[act].ok])) as Proposal['may'],
    whyNot: Object.fromEntries(acts.flatMap((act) => (can[act].ok ? [] : [[act, can[act].why]]))),
  };
}
