import type { ReactNode } from 'react';
import type { Block, Side } from '@/domain/revision/sideText';
import { Mark, Spans } from './Spans';

const Cells = ({ block, side }: { block: Block; side: Side }) => <Spans spans={block.cells[0] ?? []} side={side} />;

/** Rows that follow one another are one table; everything else stands alone. */
function grouped(blocks: readonly Block[]): Block[][] {
  const groups: Block[][] = [];
  for (const block of blocks) {
    const last = groups.at(-1);
    if (block.kind === 'row' && last?.[0]?.kind === 'row') last.push(block);
    else groups.push([block]);
  }
  return groups;
}

function one(block: Block, side: Side): ReactNode {
  const words = <Cells block={block} side={side} />;
  switch (block.kind) {
    case 'item':
      return (
        <p className="block-item" style={{ marginLeft: `${block.depth * 1.25}rem` }}>
          <span aria-hidden={block.marker === '•' || undefined}>
            {block.markerChanged ? <Mark side={side}>{block.marker}</Mark> : block.marker}
          </span>
          <span>{words}</span>
        </p>
      );
    case 'quote':
      return <blockquote>{words}</blockquote>;
    case 'hold':
      return <p className="block-hold">{words}</p>;
    case 'aside':
      return <p className="block-aside">{words}</p>;
    default:
      return <p>{words}</p>;
  }
}

/** The words of a step on one side. */
export const Blocks = ({ blocks, side }: { blocks: readonly Block[]; side: Side }) => (
  <div className="pane-words">
    {grouped(blocks).map((group, i) => {
      const [first] = group;
      if (!first) return null;
      if (first.kind !== 'row') return <div key={i}>{one(first, side)}</div>;
      return (
        <table key={i}>
          <tbody>
            {group.map((row, r) => (
              <tr key={r}>
                {row.cells.map((cell, c) => (
                  <td key={c} className={r === 0 ? 'font-semibold' : undefined}>
                    <Spans spans={cell} side={side} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      );
    })}
  </div>
);
