import type { Unit } from '../measure/convert';
import type { Band } from './fields';

/**
 * A drawing of an outcome as data: the screen draws it, and sets the same numbers in a table behind it for those who
 * cannot see it. Values in base units; a reading that is missing is null.
 */
export type Chart = BarsChart | ShapeChart | OrderChart;

interface Drawn {
  /** Says what is drawn: "Flow before and after cleaning". */
  title: string;
}

/** Bars beside each other, a group for each item: injectors before and after, cylinders. */
export interface BarsChart extends Drawn {
  kind: 'bars';
  unit: Unit;
  /** Step that values are rounded to, in `unit`. */
  fineness: number;
  items: string[];
  series: { label: string; values: (number | null)[] }[];
  /** Limits drawn as lines. */
  band?: Band;
  nominal?: number;
  /** Bars grow from zero unless that would hide every difference, as with cylinder pressures. */
  from?: 'zero' | 'least';
}

/** A bore or journal as it stands, its deviations drawn many times too large: a line for each axis. */
export interface ShapeChart extends Drawn {
  kind: 'shape';
  unit: Unit;
  fineness: number;
  /** From the top down: "Top", "Middle", "Bottom". */
  heights: string[];
  axes: { label: string; diameters: (number | null)[] }[];
  nominal?: number;
  band?: Band;
}

/** Bolts where they stand, in the order they are tightened, one at a time and pass by pass. */
export interface OrderChart extends Drawn {
  kind: 'order';
  /** [right, down] in m, bolt 1 first. */
  positions: [number, number][];
  /** Bolt numbers from 1 in turn. */
  order: number[];
  /** Torque of each pass in N·m, the last the final one; empty where none is known. */
  passes: number[];
}
