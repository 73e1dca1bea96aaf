import { ThreadNote } from '@/components/threads/ThreadNote';
import { aboutOf, KIND_WORDS } from '@/components/threads/words';
import type { Thread } from '@/domain/api/schemas/threads';
import { useDesk } from './desk';

function Note({ thread, apart = false }: { thread: Thread; apart?: boolean }) {
  const { talk } = useDesk();
  return (
    <ThreadNote
      thread={thread}
      apart={apart}
      people={talk.list.people}
      version={0}
      pending={talk.pending === thread.id}
      trouble={talk.trouble?.thread === thread.id ? talk.trouble : null}
      onReply={(text, photos) => talk.reply(thread.id, text, photos)}
      onTurn={(act) => (act === 'accept' ? talk.accept(thread) : void talk.turn(thread, act))}
    />
  );
}

/** What is still open of the very place that is being edited. */
export function ThreadsHere({ anchor }: { anchor: string }) {
  const { threads } = useDesk();
  return threads
    .filter((thread) => thread.anchor === anchor || thread.anchor?.startsWith(`${anchor}.`))
    .map((thread) => <Note key={thread.id} thread={thread} />);
}

/** All that is still open, above everything: what stands nowhere else in full, the rest with the way to it. */
export function ThreadsAhead() {
  const { threads, draft, choose } = useDesk();
  if (threads.length === 0) return null;
  const placeOf = ({ anchor, gone }: Thread) => {
    if (anchor === null || gone) return null;
    if (!anchor.startsWith('step:')) {
      const list = anchor.split('.')[0] ?? '';
      return LISTS.find((one) => one === list) ? { list: list as (typeof LISTS)[number] } : null;
    }
    const step = draft.steps.find(({ id }) => id === anchor.slice(5));
    return step ? { step: step.id } : null;
  };
  return (
    <section aria-label="Still open" className="px-5 py-4 sm:px-7">
      <h2 className="text-lead">Still open</h2>
      <ul className="mt-1 flex flex-col gap-1.5">
        {threads.map((thread) => {
          const place = placeOf(thread);
          return (
            <li key={thread.id}>
              {place ? (
                <p>
                  {KIND_WORDS[thread.kind]}{' '}
                  <button
                    type="button"
                    className="min-h-[1.75rem] text-left font-semibold text-petrol underline underline-offset-[3px]"
                    onClick={() => choose(place)}
                  >
                    {aboutOf(thread)}
                  </button>
                </p>
              ) : (
                <Note thread={thread} apart />
              )}
            </li>
          );
        })}
      </ul>
    </section>
  );
}

const LISTS = ['parts', 'tools', 'supplies', 'torques', 'limits', 'cautions', 'timers', 'figures', 'sources'] as const;
