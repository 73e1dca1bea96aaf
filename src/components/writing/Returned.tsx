import { Notice } from '@/components/ui/Notice';
import { dayOf } from '@/components/ui/day';
import { useDesk } from './desk';
import { ThreadsHere } from './DeskThreads';

/** What reviewers wrote about the very place that is being edited. */
export function RemarksHere({ anchor }: { anchor: string }) {
  const { remarks } = useDesk();
  return (
    <>
      {remarks
        .filter((remark) => remark.anchor === anchor || remark.anchor?.startsWith(`${anchor}.`))
        .map((remark) => (
          <Notice key={remark.id} title={`${remark.person.name}, ${dayOf(remark.at)}`}>
            <p className="whitespace-pre-line font-serif italic">{remark.text}</p>
          </Notice>
        ))}
      <ThreadsHere anchor={anchor} />
    </>
  );
}

/** The editor's reasons, above everything, each with the way to what it speaks of. */
export function Returned() {
  const { remarks, draft, goTo } = useDesk();
  if (remarks.length === 0) return null;
  const where = (anchor: string | null) => {
    const id = anchor?.replace(/^step:/, '');
    const at = anchor?.startsWith('step:') ? draft.steps.findIndex((step) => step.id === id) : -1;
    if (at >= 0) return { words: `Step ${at + 1}, ${draft.steps[at]?.title}`, path: `steps.${at}.body` };
    const list = anchor?.split('.')[0] ?? '';
    return anchor && !anchor.startsWith('step:') ? { words: 'Go to the value', path: `${list}.0` } : null;
  };
  return (
    <section aria-label="Why it was returned" className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-7">
      <h2 className="text-lead">Returned to you</h2>
      <ul className="mt-2 flex flex-col gap-3">
        {remarks.map((remark) => {
          const place = where(remark.anchor);
          return (
            <li key={remark.id} className="max-w-prose">
              <p className="whitespace-pre-line font-serif italic">{remark.text}</p>
              <p className="text-ink-2">
                {remark.person.name}, {dayOf(remark.at)}
                {place && (
                  <>
                    {' · '}
                    <button
                      type="button"
                      className="font-semibold text-petrol underline underline-offset-[3px]"
                      onClick={() => goTo(place.path)}
                    >
                      {place.words}
                    </button>
                  </>
                )}
              </p>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
