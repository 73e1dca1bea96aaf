import { fileName, slugOf } from '../slug';
import type { Commit, Ident } from './fastImport';
import { inOrder, type Happening } from './inOrder';

export interface Who {
  id: string;
  name: string;
  /** Null for a release. */
  email: string | null;
}

interface Told extends Happening {
  letter: string;
  title: string;
  reason: string;
  /** Who answers for it: published, withdrew or brought back. */
  by: Who;
}

export interface Publication extends Told {
  kind: 'published';
  revisionId: string;
  source: string;
  hash: string;
  author: Who;
  /** When the author sent it in; null for what came with a release. */
  proposedAt: string | null;
  reviewers: readonly string[];
  overrides: readonly { torque: string; reason: string; person: string }[];
}

export interface Withdrawal extends Told {
  kind: 'withdrawn' | 'brought back';
}

export type BookEvent = Publication | Withdrawal;

/**
 * The address of each person in the history. By default one that leads nowhere (RFC 2606 keeps `.invalid` free), so that
 * a repository that is passed on hands out no real ones.
 */
export function addressesOf(people: readonly Who[], real: boolean): (who: Who) => string {
  const taken = new Set<string>();
  const made = new Map<string, string>();
  // By id, so that of two with one name the same one is the first each time.
  for (const { id, name } of [...people].sort((a, b) => (a.id < b.id ? -1 : 1))) {
    if (made.has(id)) continue;
    const slug = slugOf(name) || 'nobody';
    let address = slug;
    for (let n = 2; taken.has(address); n += 1) address = `${slug}-${n}`;
    taken.add(address);
    made.set(id, address);
  }
  return ({ id, email }) => (real && email ? email : `${made.get(id) ?? 'nobody'}@book.invalid`);
}

const oneLine = (text: string): string => text.replace(/\s+/gu, ' ').trim();

/** Trailers as `git interpret-trailers` reads them: the last paragraph, a line each. */
const trailers = (lines: readonly (readonly [string, string])[]): string =>
  lines.map(([name, value]) => `${name}: ${oneLine(value)}`).join('\n');

function messageOf(event: BookEvent): string {
  const subject = oneLine(
    `${event.number} ${event.letter}, ${event.title}${event.kind === 'published' ? '' : `: ${event.kind}`}`,
  );
  const common = [['Procedure', event.number]] as const;
  const told =
    event.kind === 'published'
      ? [
          ...event.reviewers.map((name) => ['Reviewed-by', name] as const),
          ...event.overrides.map(
            ({ torque, reason, person }) => ['Overrides', `${torque}, by ${person}: ${reason}`] as const,
          ),
          ['Revision', event.letter] as const,
          ['Sheet-check', event.hash.slice(0, 8)] as const,
        ]
      : [['Revision', event.letter] as const];
  return `${[subject, event.reason.replace(/\r\n?/g, '\n').trim(), trailers([...told, ...common])].filter(Boolean).join('\n\n')}\n`;
}

/**
 * The commits of a book, one for each publication, withdrawal and bringing back, in the order in which they happened.
 * A procedure's file keeps the name that the title of its first revision gave it: a number is never another procedure,
 * and so `git log` and `git blame` follow a file without guessing at renames. A withdrawal deletes it.
 */
export function commitsOf(events: readonly BookEvent[], { realAddresses = false } = {}): Commit[] {
  const people = events.flatMap((event) => [event.by, ...(event.kind === 'published' ? [event.author] : [])]);
  const address = addressesOf(people, realAddresses);
  const ident = (who: Who, at: string): Ident => ({ name: who.name, email: address(who), at });
  const paths = new Map<string, string>();
  const texts = new Map<string, string>();
  return inOrder(events).map((event): Commit => {
    const { number, title, at, by } = event;
    const path = paths.get(number) ?? `content/procedures/${fileName(number, title)}`;
    paths.set(number, path);
    const published = event.kind === 'published';
    if (published) texts.set(number, event.source);
    return {
      author: published ? ident(event.author, event.proposedAt ?? at) : ident(by, at),
      committer: ident(by, at),
      message: messageOf(event),
      changes:
        event.kind === 'withdrawn'
          ? [{ kind: 'delete', path }]
          : [{ kind: 'write', path, content: texts.get(number) ?? '' }],
      tags: published ? [`${number}/${event.letter}`] : [],
    };
  });
}
