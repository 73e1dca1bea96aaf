import type { Torque } from './schema';

/** One bolt of a drawing. `place` is its turn in the tightening order from 1, null where no order is given. */
export interface DrawnBolt {
  /** Its number: the place in `positions`, from 1. */
  bolt: number;
  place: number | null;
  x: number;
  y: number;
}

export interface Drawing {
  width: number;
  height: number;
  bolts: DrawnBolt[];
}

/** Size of a drawing in its own units, for example CSS pixels. */
export interface Paper {
  width: number;
  /** The drawing is made narrower where it would otherwise be taller than this. */
  maxHeight: number;
  /** Room around the outermost bolt centres: radius of the bolt's circle and the rim beyond it. */
  margin: number;
}

/**
 * Where each bolt stands on a drawing: positions in mm (x right, y down) fitted into the paper, to scale, centred.
 * A row has no height but its margins. Null for a torque without positions.
 */
export function drawBolts(torque: Pick<Torque, 'positions' | 'order'>, paper: Paper): Drawing | null {
  const { positions = [], order } = torque;
  if (positions.length === 0) return null;
  const xs = positions.map(([x]) => x);
  const ys = positions.map(([, y]) => y);
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  const [wide, tall] = [Math.max(...xs) - left, Math.max(...ys) - top];
  const [innerWidth, innerHeight] = [paper.width - 2 * paper.margin, paper.maxHeight - 2 * paper.margin];
  const scale = Math.min(wide > 0 ? innerWidth / wide : Infinity, tall > 0 ? innerHeight / tall : Infinity);
  // A single bolt has no extent to fit.
  const mm = Number.isFinite(scale) ? scale : 0;
  const height = tall * mm + 2 * paper.margin;
  const offset = (paper.width - wide * mm) / 2;
  const place = new Map(order?.map((bolt, i) => [bolt, i + 1]));
  return {
    width: paper.width,
    height,
    bolts: positions.map(([x, y], i) => ({
      bolt: i + 1,
      place: place.get(i + 1) ?? null,
      x: offset + (x - left) * mm,
      y: paper.margin + (y - top) * mm,
    })),
  };
}
