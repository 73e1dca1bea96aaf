import { decideFlag, FLAG_KINDS, LONGEST_FLAG, type FlagAct } from '@/domain/flags/flags';
import type { Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import { now } from '../clock';
import { app } from '../context';
import { invalid, notFound, refusalOf, stale } from '../refusal';
import { startProposal } from '../review/startProposal';
import { loadFlag, type FlagView, type LoadedFlag } from './rows';
import { shownFlag, type ShownFlag } from './shown';

/** Asks the rules; refuses 404, 403, 422 or 409 with their words. */
async function allowed(
  actor: Actor,
  id: string,
  what: FlagAct,
): Promise<{ flag: LoadedFlag; state: FlagView['state'] }> {
  const flag = await loadFlag(id);
  if (!flag) throw notFound();
  const decision = decideFlag(what, actor, flag.facts);
  if (decision.ok) return { flag, state: decision.state };
  if (decision.kind === 'conflict') throw stale(decision.why, { state: flag.view.state });
  throw refusalOf(decision, 'text');
}

async function end(
  actor: Actor,
  { view }: LoadedFlag,
  state: FlagView['state'],
  more: { answer?: string; proposalId?: string } = {},
): Promise<void> {
  const { db } = await app();
  await db.models.Flag.update(
    { state, endedById: actor.personId, endedAt: now(), ...more },
    { where: { id: view.id } },
  );
  await appendAudit({
    actorId: actor.personId,
    act: `flag.${state.replace(' ', '-')}`,
    subject: { type: 'flag', id: view.id },
    shopId: view.book.shopId,
    detail: { number: view.number, ...(more.proposalId && { proposal: more.proposalId }) },
  });
}

async function fresh(actor: Actor, id: string): Promise<ShownFlag> {
  const flag = await loadFlag(id);
  if (!flag) throw notFound();
  return shownFlag(actor, flag);
}

/** Answers a flag; whoever raised it is told on their next page. */
export async function answerFlag(actor: Actor, id: string, text: string): Promise<ShownFlag> {
  if (text.length > LONGEST_FLAG)
    throw invalid('The answer is too long.', [
      { path: 'text', message: `must be ${LONGEST_FLAG} characters or fewer` },
    ]);
  const { db } = await app();
  await db.write(async () => {
    const { flag, state } = await allowed(actor, id, { act: 'answer', text });
    await end(actor, flag, state, { answer: text.trim() });
  });
  return fresh(actor, id);
}

/** Takes back one's own flag. */
export async function withdrawFlag(actor: Actor, id: string): Promise<ShownFlag> {
  const { db } = await app();
  await db.write(async () => {
    const { flag, state } = await allowed(actor, id, { act: 'withdraw' });
    await end(actor, flag, state);
  });
  return fresh(actor, id);
}

/** Starts a draft of a change from a flag, with the flag as its reason. */
export async function takeUpFlag(actor: Actor, id: string): Promise<ShownFlag> {
  const { flag } = await allowed(actor, id, { act: 'take up' });
  const { db } = await app();
  const [current] = await db.read<{ letter: string; source: string }>(
    `SELECT r.letter, r.source FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.number = :number`,
    { number: flag.view.number },
  );
  if (!current) throw notFound();
  await db.write(async () => {
    const { state } = await allowed(actor, id, { act: 'take up' });
    const draft = await startProposal(actor, flag.view.number, {
      base: current.letter,
      source: current.source,
      reason: reasonFrom(flag.view),
    });
    await end(actor, flag, state, { proposalId: draft.id });
  });
  return fresh(actor, id);
}

/** "Lotte Vance at step 8, Pull the cover down. Something is unclear: …" */
export function reasonFrom({
  raisedBy,
  step,
  kind,
  text,
}: Pick<FlagView, 'raisedBy' | 'step' | 'kind' | 'text'>): string {
  const where = !step
    ? ''
    : step.number === null
      ? ` at the step "${step.title}"`
      : ` at step ${step.number}, ${step.title}`;
  return `Flag by ${raisedBy.name}${where}. ${FLAG_KINDS[kind]}: ${text}`;
}
