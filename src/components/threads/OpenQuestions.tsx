import type { Thread } from '@/domain/api/schemas/threads';
import { openQuestions } from './words';

/** How many questions hold publishing up, each with the way to it. */
export function OpenQuestions({ threads }: { threads: readonly Thread[] }) {
  const open = openQuestions(threads);
  if (open.length === 0) return null;
  return (
    <div id="open-questions" className="open-questions">
      <p className="font-semibold">
        {open.length === 1
          ? '1 open question, to be answered and resolved before it is published'
          : `${open.length} open questions, to be answered and resolved before it is published`}
      </p>
      <ul>
        {open.map(({ id, place, gone, answered }) => (
          <li key={id}>
            <a href={`#thread-${id}`}>
              {gone ? 'Was on ' : 'On '}
              {place}
            </a>
            {answered ? ', answered' : ''}
          </li>
        ))}
      </ul>
    </div>
  );
}
