import type { ReactNode } from 'react';
import type { Side, Span } from '@/domain/revision/sideText';

function styled({ text, strong, emphasis, code }: Span): ReactNode {
  if (code) return <code>{text}</code>;
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

/** Words of one of two texts, with its own marked. Links stay words here: the text is judged, not followed. */
export const Spans = ({ spans, side }: { spans: readonly Span[]; side: Side }) => (
  <>
    {spans.map((span, i) =>
      span.changed ? (
        <Mark key={i} side={side}>
          {styled(span)}
        </Mark>
      ) : (
        <span key={i}>{styled(span)}</span>
      ),
    )}
  </>
);
