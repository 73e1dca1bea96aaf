import type { Element, ElementContent } from 'hast';

const MOST = 20;
/** A name of a row is short; a long cell said in each of many rows would make a page out of all proportion. */
const MOST_REPEATED = 2_000;
const MOST_REPEATS = 2_000;

const sizeOf = (node: ElementContent): number =>
  node.type === 'element'
    ? node.children.reduce((sum, child) => sum + sizeOf(child), JSON.stringify(node.properties).length + 10)
    : node.type === 'text'
      ? node.value.length
      : 0;
const spanOf = (cell: Element, name: 'colSpan' | 'rowSpan'): number => Math.trunc(Number(cell.properties[name] ?? 1));
const columnsOf = (cell: Element): number => Math.min(MOST, Math.max(1, spanOf(cell, 'colSpan') || 1));
/** None says "as far as the table goes". */
function rowsOf(cell: Element, left: number): number {
  const rows = spanOf(cell, 'rowSpan');
  return rows === 0 ? left : Math.min(left, Math.max(1, rows || 1));
}

/**
 * The cells of a table by column. One that spans rows stands in each of them, so that every number keeps the name of its
 * row and its column; one that spans columns is followed by empty ones (null).
 */
export function gridOf(rows: readonly (readonly Element[])[]): (Element | null)[][] {
  /** Per column, the cell that reaches down into it, and for how many rows yet. */
  const open: { cell: Element | null; rows: number }[] = [];
  let repeats = MOST_REPEATS;
  return rows.map((cells, r) => {
    const out: (Element | null)[] = [];
    const reachingDown = () => {
      for (let above = open[out.length]; above && above.rows > 0; above = open[out.length]) {
        above.rows -= 1;
        out.push(above.cell);
      }
    };
    for (const cell of cells) {
      reachingDown();
      const wide = columnsOf(cell);
      const down = Math.min(rowsOf(cell, rows.length - r) - 1, Math.floor(repeats / wide));
      repeats -= down * wide;
      const again = down > 0 && sizeOf(cell) <= MOST_REPEATED ? cell : null;
      for (let column = 0; column < wide; column += 1) {
        open[out.length] = { cell: column === 0 ? again : null, rows: down };
        out.push(column === 0 ? cell : null);
      }
    }
    // A row that is too short has empty cells ahead of what still reaches into it.
    while (open.slice(out.length).some((above) => above.rows > 0)) {
      reachingDown();
      if (open.slice(out.length).some((above) => above.rows > 0)) out.push(null);
    }
    return out;
  });
}
