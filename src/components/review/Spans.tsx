import { Fragment, type ReactNode } from 'react';
import type { Side, Span } from '@/domain/revision/sideText';

function styled({ text, strong, emphasis, code, value }: Span): ReactNode {
  if (code) return <code>{text}</code>;
  if (value) return <span className="value whitespace-nowrap">{text}</span>;
  const inner = emphasis ? <em>{text}</em> : text;
  return strong ? <strong className="font-bold">{inner}</strong> : inner;
}

/** What one text has and the other has not, told to ears as well. */
export const Mark = ({ side, children }: { side: Side; children: ReactNode }) =>
  side === 'old' ? (
    <del className="mark-old">
      <span className="sr-only">Removed: </span>
      {children}
    </del>
  ) : (
    <ins className="mark-new">
      <span className="sr-only">Added: </span>
      {children}
    </ins>
  );

/** Neighbours that are changed alike make one mark. */
function stretches(spans: readonly Span[]): Span[][] {
  const out: Span[][] = [];
  for (const span of spans) {
    const last = out.at(-1);
    if (last?.[0]?.changed === span.changed) last.push(span);
    else out.push([span]);
  }
  return out;
}

/** Words of one of two texts, with its own marked. Links stay words here: the text is judged, not followed. */
export const Spans = ({ spans, side }: { spans: readonly Span[]; side: Side }) => (
  <>
    {stretches(spans).map((stretch, i) => {
      const words = stretch.map((span, j) => <Fragment key={j}>{styled(span)}</Fragment>);
      return stretch[0]?.changed ? (
        <Mark key={i} side={side}>
          {words}
        </Mark>
      ) : (
        <Fragment key={i}>{words}</Fragment>
      );
    })}
  </>
);
