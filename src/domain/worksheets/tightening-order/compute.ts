import { checkOrder, type CheckedOrder } from '../../measure/order/check';
import { makeOrder, type MadeOrder } from '../../measure/order/make';
import { PASS_SHARES, passTorques, type Pass } from '../../measure/order/passes';
import type { Position } from '../../measure/order/positions';
import { said } from '../../measure/said';
import { type FieldProblem, type Worked, refused, worked } from '../../measure/worked';
import type { Chart } from '../charts';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import { showTorque } from '../showTorque';
import { readOrder } from './readOrder';
import type { fields } from './schema';

const CIRCLES =
  'Circles: what the published orders share, US Army TB 9-3950-253-13&P WP 0061 and a flange order in the style of ASME PCC-1 quoted in a secondary work.';
const ROWS = 'Rows from the middle outward, and other shapes likewise: common practice, no source.';

const KINDS: Readonly<Record<MadeOrder['kind'], string>> = {
  row: 'The bolts stand in a row: from the middle outward, side by side in turn.',
  circle:
    'The bolts stand in a circle: each is followed by the one across, and each pair stands as far as it can from those before.',
  other:
    'The bolts stand neither in a row nor evenly round a circle: from the middle outward, each followed by one across.',
};

const SHARES = { flange: PASS_SHARES.flange, two: PASS_SHARES.two, one: [1] } as const;
const PASS_SOURCES = {
  flange: '30, 60, 100 %: quoted in secondary works; common on flanges.',
  two: '70 %, then 100 %, above 30 lbf·ft: US Army TB 9-3950-253-13&P WP 0061.',
  one: undefined,
} as const;

/** From the places of the computation to the boxes: positions.2.0 is positions.2.x, order.3 is the one box of the order. */
const inBoxes = (problems: readonly FieldProblem[]): FieldProblem[] =>
  problems.map(({ field, message }) => ({
    field: field.startsWith('order')
      ? 'order'
      : field
          .replace(/^(positions\.\d+)$/, '$1.x')
          .replace(/\.0$/, '.x')
          .replace(/\.1$/, '.y'),
    message,
  }));

function passResults(passes: readonly Pass[], source: string | undefined): Result[] {
  return passes.map(({ share, torque }, i) => ({
    key: `pass-${i + 1}`,
    label: `Pass ${i + 1}, ${Math.round(share * 100)} %`,
    value: torque,
    unit: 'N·m',
    text: showTorque(torque),
    ...(source !== undefined && { source }),
  }));
}

/** A tightening order from where the bolts stand, another one looked over, and the torque of each pass. */
export function compute({ positions: rows, order: text, final, passes }: Values<typeof fields>): Worked<Outcome> {
  const positions = rows.map(({ x, y }): Position => [x * 1000, y * 1000]);
  const made = makeOrder(positions);
  if (!made.ok) return refused(...inBoxes(made.problems));
  const given = text === undefined ? undefined : readOrder(text);
  if (given === null)
    return refused({ field: 'order', message: 'The order must be bolt numbers, for example 3 8 2 7.' });
  const checked = given === undefined ? undefined : checkOrder(positions, given);
  if (checked && !checked.ok) return refused(...inBoxes(checked.problems));
  const torques = final === undefined ? undefined : passTorques(final, SHARES[passes]);
  if (torques && !torques.ok) return torques;

  const results: Result[] = [
    {
      key: 'order',
      label: 'Order',
      value: null,
      unit: null,
      text: said`Bolts ${made.value.order.join(' · ')}`,
      source: made.value.kind === 'circle' ? CIRCLES : ROWS,
      main: true,
    },
    ...passResults(torques?.value ?? [], PASS_SOURCES[passes]),
  ];
  const found = checked?.value.findings ?? [];
  const reasons = [
    ...found.map(({ message }) => said`${message}`),
    ...(checked && found.length === 0 ? [said`Nothing is wrong with the order ${given?.join(' ') ?? ''}.`] : []),
    said`${KINDS[made.value.kind]}`,
  ];
  return worked({
    verdict: found.length > 0 ? 'look' : 'none',
    reasons,
    results,
    charts: chartsOf(rows, made.value, given, checked?.value, torques?.value ?? []),
  });
}

/** The order that is worked out, and beside it the one that was typed where it names every bolt once. */
function chartsOf(
  rows: readonly { x: number; y: number }[],
  made: MadeOrder,
  given: readonly number[] | undefined,
  checked: CheckedOrder | undefined,
  passes: readonly Pass[],
): Chart[] {
  const chart = (title: string, order: readonly number[]): Chart => ({
    kind: 'order',
    title,
    positions: rows.map(({ x, y }): [number, number] => [x, y]),
    order: [...order],
    passes: passes.map(({ torque }) => torque),
  });
  const isWhole = checked?.findings.every(({ name }) => name.startsWith('not ')) ?? false;
  return [chart('Order worked out', made.order), ...(given && isWhole ? [chart('Order that was typed', given)] : [])];
}
