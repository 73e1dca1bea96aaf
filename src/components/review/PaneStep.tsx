import type { ReactNode } from 'react';
import { SignalWord } from '@/components/sheet/SignalPanel';
import type { Side } from '@/domain/revision/sideText';
import { isChange, type CautionLine, type StepPair } from '@/domain/revision/twoTexts';
import { Blocks } from './Blocks';
import { Spans } from './Spans';

const Caution = ({ caution, side }: { caution: CautionLine; side: Side }) => (
  <div className="pane-caution">
    <SignalWord signal={caution.signal} className="!px-2 !py-0 !text-small" />
    <p>
      {caution.otherSignal && (
        <b className="font-semibold">
          {side === 'old' ? 'Becomes' : 'Was'} {caution.otherSignal}.{' '}
        </b>
      )}
      <Spans spans={caution.spans} side={side} />
    </p>
  </div>
);

/** What is to be said of the step as a whole, in words. */
function remark({ kind, moved, old, now, effects, critical }: StepPair, side: Side, alone: boolean): string | null {
  const place = side === 'old' ? now?.number : old?.number;
  const said = [
    side === 'old' && kind === 'removed' && 'Removed',
    side === 'new' && kind === 'added' && !alone && 'Added',
    moved && place && (side === 'old' ? `Moves to step ${place}` : `Moved, was step ${place}`),
    ...(side === 'new' || kind === 'removed' ? effects : []),
    critical && (side === 'new' || kind === 'removed') && `Critical: ${critical}`,
  ].filter(Boolean);
  return said.length > 0 ? `${said.join('. ')}.` : null;
}

/** One step in one of the panes. `children` stand below its words: remarks, and what can be done here. */
export function PaneStep({
  pair,
  side,
  tag,
  children,
}: {
  pair: StepPair;
  side: Side;
  /** Which text this is, said where both stand in one column: "C, published". Null where there is only one text. */
  tag: string | null;
  children?: ReactNode;
}) {
  const it = side === 'old' ? pair.old : pair.now;
  if (!it) return null;
  const said = remark(pair, side, tag === null);
  const changed = isChange(pair);
  return (
    <div
      className="pane-step"
      data-kind={pair.kind}
      data-moved={pair.moved || undefined}
      data-changed={changed || undefined}
    >
      {changed && tag !== null && <p className="side-tag">{tag}</p>}
      {it.cautions.map((caution) => (
        <Caution key={caution.key} caution={caution} side={side} />
      ))}
      <h3 data-line={pair.id} data-side={side} tabIndex={changed ? -1 : undefined}>
        {it.number !== null && <span className="pane-number">{it.number}</span>}
        <Spans spans={it.title} side={side} />
      </h3>
      {said && <p className="pane-said">{said}</p>}
      <Blocks blocks={it.blocks} side={side} />
      {children}
    </div>
  );
}
