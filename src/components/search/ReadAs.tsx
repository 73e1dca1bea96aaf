import { counted } from '@/components/sheet/words';
import type { SearchAnswer } from '@/domain/search/engine';

const MOST_NAMES = 3;

function Read({ children }: { children: string }) {
  return <span className="text-ink underline decoration-petrol decoration-2 underline-offset-4">{children}</span>;
}

/** Holds its place before it is true, so that nothing moves when it becomes so. */
export function Kept({ kept }: { kept: boolean }) {
  return (
    <span data-needs-script className={kept ? undefined : 'invisible'}>
      {' '}
      Works without network.
    </span>
  );
}

/** What the query was taken for, how many sheets there are, and whether it needs the network. */
export function ReadAs({ answer, kept }: { answer: SearchAnswer; kept: boolean }) {
  const { readAs, total, near } = answer;
  const said = [...readAs.quantities, ...readAs.synonyms.map((names) => names.slice(0, MOST_NAMES).join(', '))];
  return (
    <p role="status" className="mt-3 min-h-[1.625rem] text-[1.0625rem] leading-relaxed text-ink-2">
      {said.length > 0 && (
        <>
          Read as{' '}
          {said.map((text, i) => (
            <span key={`${i} ${text}`}>
              {i > 0 && (i === said.length - 1 ? ' and ' : ', ')}
              <Read>{text}</Read>
            </span>
          ))}
          .{' '}
        </>
      )}
      {near && total > 0
        ? `No sheet holds all of it; ${counted(total, 'comes', 'come')} near.`
        : total === 0
          ? 'No sheet.'
          : `${counted(total, 'sheet')}.`}
      <Kept kept={kept} />
    </p>
  );
}
