import { type Worked, work } from '../worked';
import { type Pattern, recognisePattern } from './pattern';
import { type Position, distance } from './positions';

/** Bolts whose distances from the middle differ by less than this share of the largest count as equally far. */
export const RING_TOLERANCE = 0.02;

/** The entry for which `rank` is largest, the earliest of equals. `slip` is what counts as equal. */
function best<T>(list: readonly T[], rank: (entry: T) => number, slip: number): T | undefined {
  let found: T | undefined;
  for (const entry of list) if (found === undefined || rank(entry) > rank(found) + slip) found = entry;
  return found;
}

/** Nearest ring first; within a ring each bolt is followed by the one farthest from it, to keep the part level. */
function outward(positions: readonly Position[], from: readonly number[]): number[] {
  const slack = RING_TOLERANCE * Math.max(...from);
  const left = positions.map((_, i) => i).sort((a, b) => (from[a] ?? 0) - (from[b] ?? 0) || a - b);
  const order: number[] = [];
  while (left.length > 0) {
    const nearest = from[left[0] ?? 0] ?? 0;
    const ring = left.filter((i) => (from[i] ?? 0) <= nearest + slack).sort((a, b) => a - b);
    while (ring.length > 0) {
      const last = positions[order.at(-1) ?? -1];
      const next = best(ring, (i) => (last ? distance(positions[i] ?? last, last) : 0), slack) ?? 0;
      ring.splice(ring.indexOf(next), 1);
      left.splice(left.indexOf(next), 1);
      order.push(next);
    }
  }
  return order;
}

/**
 * Opposite pairs round a circle of `n` places: place k and the place across from it. With an odd number no place
 * is exactly across; each gets one of the two nearest, and one place is left over.
 */
function pairsOf(n: number): { pairs: [number, number][]; single: number[] } {
  const half = Math.floor(n / 2);
  const across = (k: number): [number, number] => (n % 2 === 0 ? [k, k + half] : [(n - k) % n, half - k]);
  return { pairs: Array.from({ length: half }, (_, k) => across(k)), single: n % 2 === 0 ? [] : [half + 1] };
}

/** Steps between the diameters through two places of `n`; a place and the one across are one diameter. */
export function betweenDiameters(a: number, b: number, n: number): number {
  const turned = Math.abs(a - b) % (n / 2);
  return Math.min(turned, n / 2 - turned);
}

/** Star: a pair across, then the pair whose diameter lies farthest from all that are done, then from the last. */
function star(places: readonly number[]): number[] {
  const n = places.length;
  const { pairs, single } = pairsOf(n);
  const done: [number, number][] = [];
  const steps = ([a]: [number, number], other: [number, number] | undefined) =>
    other ? betweenDiameters(a, other[0], n) : 0;
  while (pairs.length > 0) {
    const away = (pair: [number, number]) => Math.min(n, ...done.map((other) => steps(pair, other)));
    const farthest = Math.max(...pairs.map(away));
    const candidates = pairs.filter((pair) => away(pair) === farthest);
    const next = best(candidates, (pair) => steps(pair, done.at(-1)), 0);
    if (!next) break;
    pairs.splice(pairs.indexOf(next), 1);
    done.push(next);
  }
  return [...done.flat(), ...single].map((place) => places.indexOf(place));
}

function orderOf(pattern: Pattern, positions: readonly Position[]): number[] {
  if (pattern.kind === 'circle') return star(pattern.places);
  const from = pattern.kind === 'row' ? pattern.along.map(Math.abs) : positions.map((p) => distance(p, pattern.centre));
  return outward(positions, from);
}

export interface MadeOrder {
  kind: Pattern['kind'];
  /** Bolt numbers from 1, in the order in which they are tightened. */
  order: number[];
}

/**
 * A tightening order for bolts at these places: from the middle outward for a row, a star for a circle (a bolt, the one
 * across, then across that diameter), from the middle outward ring by ring for anything else.
 *
 * @param positions in mm
 * @returns problems name `positions` and the bolt, as `recognisePattern` does
 *
 * Source: rows and circles, US Army TB 9-3950-253-13&P WP 0061 and the cross pattern of ASME PCC-1 (from memory);
 * other shapes extend the row outward to two directions: common practice, no source. The maker's order comes first.
 */
export function makeOrder(positions: readonly Position[]): Worked<MadeOrder> {
  const pattern = recognisePattern(positions);
  if (!pattern.ok) return pattern;
  return work([], 'positions', () => ({
    kind: pattern.value.kind,
    order: orderOf(pattern.value, positions).map((bolt) => bolt + 1),
  }));
}
