import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { dayOf } from '@/components/ui/day';
import { BULLETIN_ACTS } from './bulletinWords';

/** What a bulletin says, and who answers for it. */
export function BulletinText({ bulletin }: { bulletin: Bulletin }) {
  const { kind, number, revision, supersedes, words, by, at } = bulletin;
  const text = 'max-w-prose whitespace-pre-line font-serif text-prose';
  return (
    <>
      {words.length === 1 ? (
        <p className={text}>{words[0]}</p>
      ) : (
        <ul className={`${text} list-disc pl-5`}>
          {words.map((one) => (
            <li key={one}>{one}</li>
          ))}
        </ul>
      )}
      <p className="mt-1 text-ink-2">
        {BULLETIN_ACTS[kind]} on {dayOf(at)} by {by.name}
        {supersedes && (
          <span className="print:hidden">
            .{' '}
            <a href={`/procedures/${number}/compare?from=${supersedes}&to=${revision.letter}`}>
              See {supersedes} beside {revision.letter}
            </a>
          </span>
        )}
      </p>
    </>
  );
}
