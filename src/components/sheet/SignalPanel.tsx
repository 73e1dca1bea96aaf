import { SIGNAL_WORDS, type Caution } from '@/domain/procedure/schema';
import { classes } from '@/components/ui/classes';

type Signal = (typeof SIGNAL_WORDS)[number];

/** Panel colours by ANSI Z535.6 (from memory): white on red, black on orange and yellow, white on blue. */
const PANELS: Record<Signal, { head: string; triangle: string; mark: string }> = {
  DANGER: { head: 'bg-danger text-white', triangle: 'fill-white', mark: 'fill-danger' },
  WARNING: { head: 'bg-warning text-ink', triangle: 'fill-ink', mark: 'fill-warning' },
  CAUTION: { head: 'bg-caution text-ink', triangle: 'fill-ink', mark: 'fill-caution' },
  NOTICE: { head: 'bg-notice text-white italic', triangle: '', mark: '' },
};

/** The safety alert symbol. NOTICE has none: it never concerns a person. */
const AlertSymbol = ({ signal }: { signal: Signal }) => (
  <svg width="22" height="20" viewBox="0 0 22 20" aria-hidden="true" className="shrink-0">
    <path d="M11 .6 21.6 19.4H.4z" className={PANELS[signal].triangle} />
    <path d="M9.9 6.6h2.2l-.35 6.6h-1.5zM9.9 14.7h2.2v2.2H9.9z" className={PANELS[signal].mark} />
  </svg>
);

export const SignalWord = ({ signal, className }: { signal: Signal; className?: string }) => (
  <p
    className={classes(
      'flex items-center gap-2 px-3 py-1 text-[1.0625rem] font-semibold tracking-[0.02em] [print-color-adjust:exact]',
      PANELS[signal].head,
      className,
    )}
  >
    {signal !== 'NOTICE' && <AlertSymbol signal={signal} />}
    {signal}
  </p>
);

/** Hazard and harm as one sentence, then what to do about it. */
export const cautionText = ({ hazard, harm, avoid }: Caution) => {
  const stop = (text: string) => (/[.!?]$/.test(text) ? text : `${text}.`);
  return { hurts: stop(`${hazard} ${harm}`), avoid: stop(avoid) };
};

/**
 * A caution. `panel` stacks word over text, for a column; `band` sets them side by side across the sheet,
 * ahead of the step it guards.
 */
export function SignalPanel({ caution, shape = 'panel' }: { caution: Caution; shape?: 'panel' | 'band' }) {
  const text = cautionText(caution);
  return (
    <div
      role="note"
      aria-label={`${caution.signal}: ${caution.hazard}`}
      className={classes(
        'break-inside-avoid bg-white',
        shape === 'band' && 'sm:grid sm:grid-cols-[9.5rem_minmax(0,1fr)]',
      )}
    >
      <SignalWord signal={caution.signal} className={shape === 'band' ? 'sm:items-start sm:py-3 sm:pl-5' : ''} />
      <p className={classes('px-3 leading-snug', shape === 'band' ? 'max-w-[125ch] py-3 sm:px-5' : 'pb-3 pt-2')}>
        <strong className="font-semibold">{text.hurts}</strong> {text.avoid}
      </p>
    </div>
  );
}

/** DANGER before WARNING before CAUTION before NOTICE; the author's order within each. */
export const worstFirst = (cautions: readonly Caution[]): Caution[] =>
  [...cautions].sort((a, b) => SIGNAL_WORDS.indexOf(a.signal) - SIGNAL_WORDS.indexOf(b.signal));
