import { type Worked, numberProblem, refused, work } from '../worked';
import { RING_TOLERANCE, betweenDiameters } from './make';
import { type Pattern, recognisePattern } from './pattern';
import { type Position, distance, middleOf } from './positions';

export interface OrderFinding {
  name: 'missing' | 'twice' | 'no such bolt' | 'not outward' | 'not across' | 'not at a quarter';
  /** 'rule' for what is published; 'advice' for shapes that no rule is published for. */
  weight: 'rule' | 'advice';
  /** Bolt numbers that it is about. */
  bolts: number[];
  /** One sentence for the screen. */
  message: string;
}

export interface CheckedOrder {
  kind: Pattern['kind'];
  findings: OrderFinding[];
}

const several = (bolts: readonly number[]) => `${bolts.length === 1 ? 'Bolt' : 'Bolts'} ${bolts.join(', ')}`;
const are = (bolts: readonly number[]) => (bolts.length === 1 ? 'is' : 'are');

/** Every bolt once, and no other. */
function countFindings(order: readonly number[], count: number): OrderFinding[] {
  const all = Array.from({ length: count }, (_, i) => i + 1);
  const missing = all.filter((bolt) => !order.includes(bolt));
  const twice = all.filter((bolt) => order.indexOf(bolt) !== order.lastIndexOf(bolt));
  const strange = [...new Set(order)].filter((bolt) => !all.includes(bolt));
  const finding = (name: OrderFinding['name'], bolts: number[], message: string): OrderFinding[] =>
    bolts.length === 0 ? [] : [{ name, weight: 'rule', bolts, message }];
  return [
    ...finding('missing', missing, `${several(missing)} ${are(missing)} never tightened.`),
    ...finding('twice', twice, `${several(twice)} ${are(twice)} tightened more than once.`),
    ...finding('no such bolt', strange, `There is no bolt ${strange.join(', ')}; there are ${count}.`),
  ];
}

/** The first turn (from 0) that goes back towards the middle, by each bolt's distance from it; -1 for none. */
function firstBack(from: readonly number[], order: readonly number[]): number {
  // A hair more than a made order allows itself, for the last binary digit.
  const slack = RING_TOLERANCE * Math.max(...from) * (1 + 1e-9);
  let farthest = 0;
  return order.findIndex((bolt) => {
    const here = from[bolt - 1] ?? 0;
    const isBack = here < farthest - slack;
    farthest = Math.max(farthest, here);
    return isBack;
  });
}

/** Each bolt's rank from the middle one, for rows whose bolts do not stand evenly. */
function ranks(along: readonly number[]): number[] {
  const sorted = [...along].sort((a, b) => a - b);
  return along.map((at) => Math.abs(sorted.indexOf(at) - (along.length - 1) / 2));
}

function rowFindings(along: readonly number[], order: readonly number[]): OrderFinding[] {
  const turn = firstBack(along.map(Math.abs), order);
  if (turn < 0 || firstBack(ranks(along), order) < 0) return [];
  const bolt = order[turn] ?? 0;
  const message = `Bolt ${bolt} comes at turn ${turn + 1}, after bolts that lie farther out; a row is tightened from its middle outward.`;
  return [{ name: 'not outward', weight: 'rule', bolts: [bolt], message }];
}

function circleFindings(places: readonly number[], order: readonly number[]): OrderFinding[] {
  const n = places.length;
  const placeOf = (turn: number) => places[(order[turn] ?? 0) - 1] ?? 0;
  const isAcross = (turn: number) => {
    const steps = Math.abs(placeOf(turn) - placeOf(turn + 1));
    // With an odd number, both of the two that lie nearest to across will do.
    return Math.abs(steps - n / 2) <= 0.5;
  };
  const across = order.flatMap((bolt, turn): OrderFinding[] => {
    const next = order[turn + 1];
    if (turn % 2 === 1 || next === undefined || isAcross(turn)) return [];
    const message = `Bolt ${bolt} at turn ${turn + 1} is followed by bolt ${next}, which does not stand across the circle from it.`;
    return [{ name: 'not across', weight: 'rule', bolts: [bolt, next], message }];
  });
  const third = order[2];
  if (n < 8 || third === undefined || across.some(({ bolts }) => bolts[0] === order[0])) return across;
  if (betweenDiameters(placeOf(0), placeOf(2), n) >= n / 4 - (n % 2 === 0 ? 0.5 : 0.75)) return across;
  const message = `Bolt ${third} at turn 3 stands too near the first two; the second pair goes at a quarter turn to the first.`;
  return [...across, { name: 'not at a quarter', weight: 'rule', bolts: [third], message }];
}

/** No rule is published for other shapes, so any of three habits will do: outward, outward along, or across. */
function otherFindings(positions: readonly Position[], order: readonly number[]): OrderFinding[] {
  const middle = middleOf(positions);
  const turn = firstBack(
    positions.map((position) => distance(position, middle)),
    order,
  );
  const extent = (axis: 0 | 1) => Math.max(...positions.map((position) => Math.abs(position[axis] - middle[axis])));
  const long = extent(0) >= extent(1) ? 0 : 1;
  const isOutwardAlong =
    firstBack(
      positions.map((position) => Math.abs(position[long] - middle[long])),
      order,
    ) < 0;
  const isAcross = order.every((bolt, i) => {
    const [here, next] = [positions[bolt - 1], positions[(order[i + 1] ?? 0) - 1]];
    if (i % 2 === 1 || !here || !next) return true;
    const left = order.slice(i + 1).map((other) => distance(positions[other - 1] ?? here, here));
    return distance(here, next) >= Math.max(...left) * (1 - RING_TOLERANCE);
  });
  if (turn < 0 || isOutwardAlong || isAcross) return [];
  const bolt = order[turn] ?? 0;
  const message = `Bolt ${bolt} comes at turn ${turn + 1}, after bolts that lie farther out. No rule is published for this shape; from the middle outward is usual.`;
  return [{ name: 'not outward', weight: 'advice', bolts: [bolt], message }];
}

function shapeFindings(pattern: Pattern, positions: readonly Position[], order: readonly number[]): OrderFinding[] {
  if (pattern.kind === 'row') return rowFindings(pattern.along, order);
  if (pattern.kind === 'circle') return circleFindings(pattern.places, order);
  return otherFindings(positions, order);
}

/**
 * Looks a tightening order over: every bolt once; from the middle outward for a row; for a circle each odd turn
 * followed by the bolt across and, from eight bolts on, the second pair a quarter turn from the first.
 *
 * @param positions in mm
 * @param order bolt numbers from 1, in the order in which they are tightened
 * @returns what is wrong, an empty list for nothing; the shape is only looked at once every bolt is there once.
 *   Problems name `positions…`, `order` or `order.n`
 *
 * Source: what the published circles share (US Army TB 9-3950-253-13&P WP 0061; a flange order in the style of ASME
 * PCC-1, quoted); rows from the middle outward, common practice, no source.
 */
export function checkOrder(positions: readonly Position[], order: readonly number[]): Worked<CheckedOrder> {
  const pattern = recognisePattern(positions);
  const problems = [
    ...(pattern.ok ? [] : pattern.problems),
    ...(Array.isArray(order) && order.length > 0 ? [] : [{ field: 'order', message: 'The order is missing.' }]),
    ...(Array.isArray(order) ? order.flatMap((bolt, i) => numberProblem(`order.${i}`, `Turn ${i + 1}`, bolt)) : []),
  ];
  if (!pattern.ok || problems.length > 0) return refused(...problems);
  return work([], 'order', () => {
    const counted = countFindings(order, positions.length);
    const findings = counted.length > 0 ? counted : shapeFindings(pattern.value, positions, order);
    return { kind: pattern.value.kind, findings };
  });
}
