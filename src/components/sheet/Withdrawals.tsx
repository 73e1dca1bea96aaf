import { dayOf } from '@/components/ui/day';
import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { BULLETIN_ACTS } from './bulletinWords';

/** When a procedure was out of use, and why; the latest first. */
export const Withdrawals = ({ acts }: { acts: readonly Bulletin[] }) => (
  <section className="px-4 py-5 sm:px-9">
    <h2 className="text-lead">Withdrawn and brought back</h2>
    <ul>
      {acts.map(({ id, kind, revision, words, by, at }) => (
        <li key={id} className="border-t border-hair py-3 first:border-t-0">
          <p>
            <b className="font-semibold">{BULLETIN_ACTS[kind]}</b> at revision {revision.letter} on {dayOf(at)} by{' '}
            {by.name}
          </p>
          <p className="max-w-prose whitespace-pre-line font-serif text-[0.9375rem] italic">{words[0]}</p>
        </li>
      ))}
    </ul>
  </section>
);
