import { listed, lowered } from '@/domain/wording';
import type { Proposal, Remark, TrailEntry } from '@/domain/api/schemas/proposals';
import { dayOf } from '@/components/ui/day';

/** What a reviewer does, each with the words of its button and of what was done. */
export type ReviewAct = 'agree' | 'publish' | 'return' | 'decline' | 'override';

export const ACT_WORDS: Record<ReviewAct, { verb: string; doing: string }> = {
  agree: { verb: 'Agree', doing: 'Agreeing' },
  publish: { verb: 'Publish', doing: 'Publishing' },
  return: { verb: 'Return', doing: 'Returning' },
  decline: { verb: 'Decline', doing: 'Declining' },
  override: { verb: 'Override', doing: 'Overriding' },
};

/** What stands above the panel of an act and on its button. */
export function panelWords(act: ReviewAct, letter: string | null): { title: string; button: string } {
  const { verb } = ACT_WORDS[act];
  const button = act === 'publish' ? `${verb} as ${letter ?? ''}` : verb;
  return { title: act === 'return' ? 'Return with reasons' : button, button };
}

/** What may just have been done when the page is shown: an act of review, or the author's own sending-in. */
export type Done = ReviewAct | 'proposed';

/** Says what was done with the word of its button, once it is so; null as long as it is not. */
export function doneWords(act: Done, proposal: Proposal, me: string): string | null {
  const { state, publishedLetter, agreed, agreements, agreementsNeeded } = proposal;
  switch (act) {
    case 'proposed':
      return state === 'proposed' ? 'Proposed.' : null;
    case 'agree':
      return agreed.some((a) => a.person.id === me && a.stands)
        ? `Agreed, ${agreements} of ${agreementsNeeded}.`
        : null;
    case 'override':
      return proposal.failing.some(({ override }) => override?.person.id === me) ? 'Clamp check overridden.' : null;
    case 'publish':
      return publishedLetter ? `Published as ${publishedLetter}.` : null;
    case 'return':
      return state === 'returned' ? `Returned to ${proposal.author.name}.` : null;
    case 'decline':
      return state === 'declined' ? 'Declined.' : null;
  }
}

export function headingOf({ title, base }: Pick<Proposal, 'title' | 'base'>, letter: string | null): string {
  if (base === null) return `${title}: new sheet`;
  return letter === null ? `${title}: a change to ${base}` : `${title}: ${base} to ${letter}`;
}

/** What the two texts of a proposal are called: above the panes, and over the columns of the values. */
export function sideNames({
  state,
  base,
  currentLetter,
  publishedLetter,
}: Pick<Proposal, 'state' | 'base' | 'currentLetter' | 'publishedLetter'>) {
  if (publishedLetter !== null)
    return { old: { pane: 'Before', column: 'Before' }, now: { pane: 'Published', column: 'Published' } };
  const now = state === 'draft' ? 'Draft' : 'Proposed';
  // An older text must not be called what is worked to now.
  const old =
    base === currentLetter
      ? { pane: 'Published', column: 'Now' }
      : { pane: 'Superseded', column: `In ${base ?? currentLetter ?? ''}` };
  return { old, now: { pane: now, column: now } };
}

const NUMBERS = ['No', 'One', 'Two', 'Three'];

/** "Two editors must agree." Why stands beside it, as the severity of the change. */
export function needed({ agreementsNeeded, book }: Pick<Proposal, 'agreementsNeeded' | 'book'>): string {
  const many = NUMBERS[agreementsNeeded] ?? String(agreementsNeeded);
  const who = agreementsNeeded === 1 ? 'editor' : book.kind === 'common' ? 'editors' : 'people';
  return `${many} ${who} must agree.`;
}

/** Whether agreements are what publishing wants first, the reader's own counted. */
export const wantsAgreement = ({ whyNot }: Pick<Proposal, 'whyNot'>): boolean =>
  /^[^.]*\bmust agree\b/.test(whyNot['publish'] ?? '');

/** Open questions stand beside the button, each with the way to it, so the sentence on them is not said twice. */
const OPEN_QUESTIONS = / ?(A question on|\d+ questions are still open:) .* resolved first\.$/s;

/**
 * Why it cannot be published yet but for open questions, to somebody whose own agreement is already counted on, or still
 * to come. Empty where questions are all that is in the way.
 */
export function whyNotYet(proposal: Pick<Proposal, 'whyNot' | 'may'>): string {
  const why = (proposal.whyNot['publish'] ?? '').replace(OPEN_QUESTIONS, '');
  // Publishing is an agreement too, so what is missing of agreements is missing besides the reader's own.
  return wantsAgreement(proposal) && proposal.may.agree ? `Besides you, ${lowered(why)}` : why;
}

/** Where a proposal stands that is not waiting for review, or that is one's own; null where its buttons say all. */
export function standingWords(proposal: Proposal, me: string): string | null {
  const { state, trail, agreed, publishedLetter, agreements, agreementsNeeded } = proposal;
  const own = proposal.author.id === me;
  const last = (what: TrailEntry['what']) => trail.filter((entry) => entry.what === what).at(-1);
  const by = (entry: TrailEntry | undefined) =>
    entry ? ` by ${entry.person.id === me ? 'you' : entry.person.name} on ${dayOf(entry.at)}` : '';
  switch (state) {
    case 'draft':
      return 'A draft. Nobody else sees it until you send it in.';
    case 'proposed': {
      if (!own) return null;
      const short = agreementsNeeded - agreements;
      return `You wrote this; somebody else agrees to it. ${agreements} of ${agreementsNeeded} agreed: it waits for ${short < 1 ? 'an editor to publish it' : short === 1 ? 'one more to agree' : 'two to agree'}.`;
    }
    case 'returned':
      return `Returned${by(last('returned'))}. ${own ? 'It waits for you: change it and send it in again.' : 'It waits for its author.'}`;
    case 'declined':
      return `Declined${by(last('declined'))}. It stays here as a record.`;
    case 'published':
    case 'superseded': {
      const agreeing = listed(agreed.filter((a) => a.stands).map((a) => (a.person.id === me ? 'you' : a.person.name)));
      const published = last('published');
      return `Published as ${publishedLetter ?? ''}${published ? ` on ${dayOf(published.at)}` : ''}${agreeing ? `, agreed by ${agreeing}` : ''}.${state === 'superseded' ? ' A later revision has taken its place.' : ''}`;
    }
  }
}

export const REMARK_WORDS: Record<Remark['kind'], string> = { returned: 'returned it', declined: 'declined it' };

/** The trail with a second sending-in told as what it is. */
export const trailWords = (trail: readonly TrailEntry[], letter: string | null) =>
  trail.map((entry, i) => {
    const again = entry.what === 'proposed' && trail.slice(0, i).some(({ what }) => what === 'proposed');
    const what = again
      ? 'improved and proposed again'
      : entry.what === 'overrode'
        ? 'overrode the clamp check'
        : entry.what;
    return { ...entry, words: what === 'published' && letter ? `published as ${letter}` : what };
  });
