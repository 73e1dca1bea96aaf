import { dayOf } from '@/components/ui/day';
import { Cell, Row, Table, type Column } from '@/components/ui/Table';
import type { DeskItem, ProposalSummary } from '@/domain/api/schemas/proposals';
import { daysSince, severityWords, takenBackWords } from '@/domain/review/desk';
import { nextLetter } from '@/domain/revision/letters';

const NEXT_WORDS: Record<DeskItem['next'], string> = {
  agree: 'Yours to judge',
  override: 'A failed clamp check, yours to judge',
  publish: 'Yours to publish',
  wait: 'Waits for another editor',
};

/** The word says how grave it is; the weight of the letters lets it be found. */
const SEVERITY_LOOK: Record<ProposalSummary['severity']['level'], string | undefined> = {
  grave: 'block border-l-8 border-ink pl-2.5 font-semibold',
  serious: 'font-semibold',
  ordinary: undefined,
};

/** "today", "1 day", "3 days". */
const waiting = (since: string, now: string) => {
  const days = daysSince(since, now);
  return days === 0 ? 'today' : `${days} ${days === 1 ? 'day' : 'days'}`;
};

const letters = ({ base, stale }: ProposalSummary) =>
  base === null ? 'new sheet' : stale ? `on ${base}, superseded` : `${base} to ${nextLetter(base)}`;

/** Proposals that wait for review. Those of a desk say what the reader can do with them; one's own do not. */
export function DeskTable({
  caption,
  columns,
  items,
  now,
}: {
  caption: string;
  columns: readonly Column[];
  items: readonly (ProposalSummary & { next?: DeskItem['next'] })[];
  /** ISO 8601 in UTC. */
  now: string;
}) {
  return (
    <Table caption={caption} columns={columns}>
      {items.map((item) => {
        const since = item.proposedAt ?? item.updatedAt;
        return (
          <Row key={item.id}>
            <Cell className="sm:w-[26%] lg:w-[30%]">
              <a href={`/proposals/${item.id}`} className="desk-title">
                {item.title}
              </a>
              <span className="block text-ink-2">
                {item.number},{' '}
                <span className={item.stale ? 'font-semibold text-ink' : undefined}>{letters(item)}</span>,{' '}
                {item.book.kind === 'common' ? 'common book' : `book of ${item.book.name}`}
              </span>
            </Cell>
            <Cell label="By" className="lg:w-[17%]">
              {item.author.name}
              {item.author.shop && (
                <span className="text-ink-2 max-sm:before:content-[',_'] sm:block">{item.author.shop}</span>
              )}
            </Cell>
            <Cell label="What it does" className="sm:w-[23%] lg:w-[26%]">
              <span className={SEVERITY_LOOK[item.severity.level]}>{severityWords(item)}</span>
              {takenBackWords(item.takesBack, 1).map((sentence) => (
                <span key={sentence} className="taken-back">
                  {sentence}
                </span>
              ))}
            </Cell>
            <Cell label="Agreed" className="lg:w-[14%]">
              {item.agreements} of {item.agreementsNeeded}
              {item.next && (
                <span className="text-ink-2 max-sm:before:content-['._'] sm:block">
                  {item.stale ? 'Waits for its author' : NEXT_WORDS[item.next]}
                </span>
              )}
            </Cell>
            <Cell label="Waiting" className="lg:w-[13%]">
              {waiting(since, now)}
              <span className="whitespace-nowrap text-ink-2 max-sm:before:content-[',_'] sm:block">
                since {dayOf(since)}
              </span>
            </Cell>
          </Row>
        );
      })}
    </Table>
  );
}
