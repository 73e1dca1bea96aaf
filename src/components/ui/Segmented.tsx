import { classes } from './classes';

export interface Segment {
  value: string;
  label: string;
  /** Spoken where the label is a symbol. */
  name?: string;
}

/**
 * Two to four choices side by side. Inside a plain form each is a submit button that carries
 * `name=value`; in an island give `onChoose` and nothing is submitted.
 */
export function Segmented({
  label,
  name,
  segments,
  value,
  onChoose,
  className,
}: {
  label: string;
  name: string;
  segments: readonly Segment[];
  value: string;
  onChoose?: (value: string) => void;
  className?: string;
}) {
  return (
    <div
      role="group"
      aria-label={label}
      className={classes('inline-flex divide-x-[1.5px] divide-ink rounded border-frame border-ink', className)}
    >
      {segments.map((segment) => (
        <button
          key={segment.value}
          type={onChoose ? 'button' : 'submit'}
          name={name}
          value={segment.value}
          aria-label={segment.name}
          aria-pressed={segment.value === value}
          onClick={onChoose && (() => onChoose(segment.value))}
          className="min-h-[43px] min-w-[46px] whitespace-nowrap bg-sheet px-3.5 max-sm:px-2.5 font-medium hover:bg-wash aria-pressed:bg-ink aria-pressed:text-white"
        >
          {segment.label}
        </button>
      ))}
    </div>
  );
}
