import { useMemo, useRef, useState, type ReactNode } from 'react';
import { foldSteps, oldOrder, type Section } from '@/domain/revision/folding';
import type { Side } from '@/domain/revision/sideText';
import { changesInWords, isChange, type StepPair } from '@/domain/revision/twoTexts';
import { ChangeSteps } from './ChangeSteps';
import { Gutter } from './Gutter';
import { PaneStep } from './PaneStep';
import { useMatchLines } from './useMatchLines';

/** One of the two texts: what it is, and its letter. */
export interface PaneName {
  name: string;
  /** Null where it has none yet. */
  letter: string | null;
  /** What it is called above a step that stands alone; "C, published" unless given. */
  tag?: string;
}

const foldLine = (id: string) => `fold ${id}`;
const never = () => false;

type GutterRow = Pick<StepPair, 'id' | 'kind' | 'moved'>;

/** One row of the gutter for each step that is open and each fold that is closed. */
const rowsOf = (sections: readonly Section<StepPair>[], open: ReadonlySet<string>) =>
  sections.flatMap((section): readonly GutterRow[] => {
    if (section.kind === 'step') return [section.pair];
    return open.has(section.id) ? section.pairs : [{ id: foldLine(section.id), kind: 'same', moved: false }];
  });

/**
 * Both texts side by side with match lines between them; in one column, old above new, where there is no room. Without
 * a script everything is there but the lines, and each fold opens by itself.
 */
export function Panes({
  pairs,
  old,
  now,
  keepOpen = never,
  below,
}: {
  pairs: readonly StepPair[];
  /** Null where there is no older text: the new one then stands alone. */
  old: PaneName | null;
  now: PaneName;
  /** Steps that are never folded away; the same function as long as its answers are the same. */
  keepOpen?: (id: string) => boolean;
  /** What stands below a step of the new text, or of the old one where it was removed. */
  below?: (pair: StepPair) => ReactNode;
}) {
  const root = useRef<HTMLDivElement>(null);
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const sections = useMemo(
    () => (old ? foldSteps(pairs, keepOpen) : pairs.map((pair): Section<StepPair> => ({ kind: 'step', pair }))),
    [pairs, keepOpen, old],
  );
  const rows = useMemo(() => rowsOf(sections, open), [sections, open]);
  const drawn = useMatchLines(root, rows);
  const order = new Map(sections.map((section, i) => [section, i]));
  const toggle = (id: string, is: boolean) =>
    setOpen((before) => {
      if (before.has(id) === is) return before;
      const after = new Set(before);
      if (is) after.add(id);
      else after.delete(id);
      return after;
    });

  const pane = (side: Side, { name, letter, tag }: PaneName, list: readonly Section<StepPair>[]) => {
    const called = tag ?? (letter === null ? name : `${letter}, ${name.toLowerCase()}`);
    const step = (pair: StepPair) => (
      <PaneStep pair={pair} side={side} tag={old && called}>
        {(side === 'new' || pair.kind === 'removed') && below?.(pair)}
      </PaneStep>
    );
    return (
      <section className={`pane pane-${side}`} aria-labelledby={`pane-${side}`}>
        <div className="pane-cap">
          <h2 id={`pane-${side}`}>{name}</h2>
          {letter !== null && (
            <span>
              <span className="sr-only">Revision </span>
              {letter}
            </span>
          )}
        </div>
        <ol data-pane>
          {list.map((section) => {
            const place = (order.get(section) ?? 0) * 2 + (side === 'new' ? 1 : 0);
            if (section.kind === 'step')
              return (
                <li key={section.pair.id} style={{ order: place }} data-once={!isChange(section.pair) || undefined}>
                  {step(section.pair)}
                </li>
              );
            const { id, pairs: inside } = section;
            return (
              <li key={`fold ${id}`} style={{ order: place }} data-once>
                <details
                  className="pane-fold"
                  open={open.has(id)}
                  onToggle={(event) => toggle(id, event.currentTarget.open)}
                >
                  <summary data-line={foldLine(id)} data-side={side}>
                    {inside.length} steps unchanged
                    <span className="fold-word" />
                  </summary>
                  <ol>
                    {inside.map((pair) => (
                      <li key={pair.id}>{step(pair)}</li>
                    ))}
                  </ol>
                </details>
              </li>
            );
          })}
        </ol>
      </section>
    );
  };

  return (
    <section aria-label="The text">
      {old && (
        <ChangeSteps root={root} words={changesInWords(pairs)} ids={pairs.filter(isChange).map(({ id }) => id)} />
      )}
      <div ref={root} className={old ? 'panes' : 'panes panes-one'}>
        {old && pane('old', old, oldOrder(sections))}
        {old && <Gutter {...drawn} />}
        {pane(
          'new',
          now,
          sections.filter((s) => s.kind === 'fold' || s.pair.now),
        )}
      </div>
    </section>
  );
}
