import { may, type Actor } from '../people/may';
import { move } from '../revision/states';
import type { RevisionState } from '../revision/types';
import { openTorques, type Override } from './overrides';
import { unfinishedReason } from './restore';
import { type Agreement, canPublish, isStale, type ProposalFacts, staleWords, subjectOf } from './rules';

/** What somebody does to a proposal, with what it takes. */
export type ProposalAct =
  | { act: 'edit' }
  | { act: 'submit' }
  | { act: 'return'; reason: string }
  | { act: 'decline'; reason: string }
  | { act: 'agree' }
  /** Of the failed clamp check of one torque, by its key. */
  | { act: 'override'; torque: string; reason: string }
  | { act: 'publish' };

/**
 * Why not: `hidden` answers 404, `forbidden` 403, `invalid` 422 (something was left out), `conflict` 409 (not in this
 * state, not on this base, or not with these agreements).
 */
export type RefusalKind = 'hidden' | 'forbidden' | 'invalid' | 'conflict';

export type Decision =
  | {
      ok: true;
      state: RevisionState;
      /** The agreements to keep, with the one that this act gives. */
      agreements: readonly Agreement[];
      /** The agreement to record, or null. Publishing records the publisher's own where it was not given before. */
      given: Agreement | null;
      /** The override to record, or null. */
      overridden: Override | null;
    }
  | { ok: false; kind: RefusalKind; why: string };

const MAY = {
  edit: 'editProposal',
  submit: 'submit',
  return: 'return',
  decline: 'decline',
  agree: 'agree',
  override: 'override',
  publish: 'publish',
} as const;

const refuse = (kind: RefusalKind, why: string): Decision => ({ ok: false, kind, why });

/**
 * The whole workflow of a proposal as one pure function: who, what, and the facts go in; what becomes of the proposal
 * comes out. The server saves what it says and decides nothing itself.
 */
export function decide(what: ProposalAct, actor: Actor, facts: ProposalFacts): Decision {
  const permission = may(actor, MAY[what.act], subjectOf(facts));
  if (!permission.ok) return refuse(permission.visible ? 'forbidden' : 'hidden', permission.why);
  const moved = move(facts.state, what.act);
  if (!moved.ok) return refuse('conflict', moved.why);

  const { agreements } = facts;
  const own: Agreement = { personId: actor.personId, hash: facts.hash, base: facts.base };
  const agreed = agreements.some((a) => a.personId === own.personId && a.hash === own.hash && a.base === own.base);
  const done = (given: Agreement | null = null, overridden: Override | null = null): Decision => ({
    ok: true,
    state: moved.state,
    agreements: given ? [...agreements, given] : agreements,
    given,
    overridden,
  });

  switch (what.act) {
    case 'edit':
      return done();
    case 'submit': {
      if (!facts.reason.trim()) return refuse('invalid', 'Write the reason for the change before you send it in.');
      const unfinished = unfinishedReason(facts.reason);
      if (unfinished) return refuse('invalid', unfinished);
      if (facts.identical)
        return refuse('invalid', 'Nothing differs from the published text yet. Change it, then send it in.');
      return isStale(facts) ? refuse('conflict', staleWords(facts)) : done();
    }
    case 'return':
    case 'decline':
      return what.reason.trim() ? done() : refuse('invalid', 'Write why, so that the author can act on it.');
    case 'agree':
      if (isStale(facts)) return refuse('conflict', staleWords(facts));
      return agreed ? refuse('conflict', 'You have agreed to this text already.') : done(own);
    case 'override': {
      const { torque, reason } = what;
      if (isStale(facts)) return refuse('conflict', staleWords(facts));
      if (facts.failing.length === 0) return refuse('conflict', 'No torque of this text fails the clamp check.');
      if (!facts.failing.some(({ key }) => key === torque))
        return refuse('invalid', `The clamp check of this text does not fail at “${torque}”.`);
      if (!openTorques(facts).some(({ key }) => key === torque))
        return refuse('conflict', 'The clamp check of this torque has been overridden already.');
      if (!reason.trim()) return refuse('invalid', 'Write why this torque is right all the same.');
      return done(null, { personId: actor.personId, hash: facts.hash, torque, reason: reason.trim() });
    }
    case 'publish': {
      const given = agreed ? null : own;
      const verdict = canPublish(given ? { ...facts, agreements: [...agreements, given] } : facts);
      return verdict.ok ? done(given) : refuse('conflict', verdict.why);
    }
  }
}

/** Whether this person could do an act now, and if not, why not. */
export function offer(act: ProposalAct['act'], actor: Actor, facts: ProposalFacts): Decision {
  // A reason is asked for when the button is pressed, so its want does not hide the button.
  const reason = 'asked for later';
  const torque = (openTorques(facts)[0] ?? facts.failing[0])?.key ?? '';
  return decide({ act, reason, torque }, actor, { ...facts, reason });
}

/** For each act, whether this person could do it now, and if not, why not; a page shows its buttons by it. */
export function offers(actor: Actor, facts: ProposalFacts): Record<ProposalAct['act'], Decision> {
  const ask = (act: ProposalAct['act']) => offer(act, actor, facts);
  return {
    edit: ask('edit'),
    submit: ask('submit'),
    return: ask('return'),
    decline: ask('decline'),
    agree: ask('agree'),
    override: ask('override'),
    publish: ask('publish'),
  };
}
