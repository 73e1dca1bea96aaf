import { capital } from '@/domain/wording';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { LEVEL_WORDS } from '@/domain/review/desk';

/** How many reasons stand in the head; the rest is found in the comparison below it. */
const MOST = 5;
/** How grave the change is and what decided it, a line for each; an ordinary one has nothing to be told. */
export function Gravity({ severity: { level, because } }: Pick<Proposal, 'severity'>) {
  if (level === 'ordinary') return null;
  const [first = '', ...others] = because;
  if (others.length === 0)
    return (
      <p className={level === 'grave' ? 'heavy-edge mt-3 px-3 py-1.5 font-semibold' : 'mt-2 font-medium'}>
        {LEVEL_WORDS[level]}: {first}.
      </p>
    );
  const named = because.length === MOST + 1 ? because : because.slice(0, MOST);
  const rest = because.length - named.length;
  return (
    <div className={level === 'grave' ? 'heavy-edge mt-3 px-3 py-2' : 'mt-2'}>
      <p className="font-semibold">
        {LEVEL_WORDS[level]}, for {because.length} reasons
      </p>
      <ul>
        {named.map((reason) => (
          <li key={reason}>{capital(reason)}</li>
        ))}
        {rest > 0 && <li>And {rest} more</li>}
      </ul>
    </div>
  );
}
