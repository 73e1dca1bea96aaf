import type { ChangeLine, ChangeWords } from '@/domain/revision/changeWords';

/** More than these stand folded away. */
const SHOWN = 6;

const Line = ({ what, effect }: ChangeLine) => (
  <li>
    {what}
    {effect && <span className="text-ink-2">. {effect}</span>}
  </li>
);

/** What a revision changed, in words. */
export function Changes({ changes }: { changes: ChangeWords }) {
  const { lines, grave } = changes;
  const [shown, folded] = [lines.slice(0, SHOWN), lines.slice(SHOWN)];
  const list = 'list-disc pl-5 marker:text-ink-2';
  return (
    <>
      {grave && (
        <p className="mb-1">
          <b className="font-semibold">Grave:</b> {grave}
        </p>
      )}
      {lines.length === 0 && <p className="text-ink-2">Nothing that a comparison shows.</p>}
      <ul className={list}>
        {shown.map((line) => (
          <Line key={line.what} {...line} />
        ))}
      </ul>
      {folded.length > 0 && (
        <details>
          <summary className="flex min-h-touch cursor-pointer items-center text-petrol underline underline-offset-[3px]">
            And {folded.length} more
          </summary>
          <ul className={list}>
            {folded.map((line) => (
              <Line key={line.what} {...line} />
            ))}
          </ul>
        </details>
      )}
    </>
  );
}
