import { FLOW, SHARE_PERCENT, SOME_PRESSURE } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** More injectors than any engine that these shops open. */
const MOST_INJECTORS = 64;

const injectorCountProblem = (count: number): FieldProblem[] => {
  const called = 'The number of injectors';
  const problem = numberProblem('count', called, count, { least: 1, most: MOST_INJECTORS });
  if (problem.length > 0 || Number.isInteger(count)) return problem;
  return [{ field: 'count', message: `${called} must be a whole number.` }];
};

/**
 * The share of the engine's power that each of a set of injectors answers for, in per cent: one of four, 25.
 * Holds where all cylinders do the same work; common practice, no source.
 */
export const sharePercent = (count: number): Worked<number> =>
  work(injectorCountProblem(count), 'count', () => 100 / count);

export interface FlowAtPressure {
  /** m³/s, or kg/s: the law is the same. */
  flow: number;
  /** Pressure across the injector at which it flows that, Pa: rail less manifold, not the gauge at the rail alone. */
  from: number;
  /** Pressure across the injector that is asked about, Pa. */
  to: number;
}

/**
 * Flow at another pressure across the injector, by the square-root law of an orifice: `flow · √(to / from)`, in the
 * unit of `flow`. It holds for one fluid at one temperature, held open; it says nothing of the time to open.
 * Source: the law as quoted by a secondary page (Δp up by half: flow up by 22.5 %). The return journey is the same
 * function with `from` and `to` exchanged.
 */
export const flowAtPressure = ({ flow, from, to }: FlowAtPressure): Worked<number> =>
  work(
    [
      ...numberProblem('flow', 'The flow', flow, FLOW),
      ...numberProblem('from', 'The pressure of the test', from, SOME_PRESSURE),
      ...numberProblem('to', 'The pressure asked about', to, SOME_PRESSURE),
    ],
    'flow',
    () => flow * Math.sqrt(to / from),
  );

export interface Supply {
  /** Density of the fuel, kg/m³: petrol 720 to 775 (from memory). The flow bench's fluid has its own. */
  density: number;
  /** How many injectors feed the engine. */
  count: number;
  /** Largest share of the time that they are held open, in per cent. */
  dutyPercent: number;
  /** Fuel used for a given work at full power, kg/J: 0.50 lb/(hp·h) is 8.448·10⁻⁸. */
  bsfc: number;
}

const supplyProblems = ({ density, count, dutyPercent, bsfc }: Supply): FieldProblem[] => [
  ...numberProblem('density', 'The density of the fuel', density, {
    above: 0,
    most: 2000,
    say: (bound) => `${bound} kg/m³`,
  }),
  ...injectorCountProblem(count),
  ...numberProblem('dutyPercent', 'The duty', dutyPercent, SHARE_PERCENT),
  // 10⁻⁵ kg/J would be an engine of 0.2 % efficiency: a unit has slipped.
  ...numberProblem('bsfc', 'The specific fuel consumption', bsfc, {
    above: 0,
    most: 1e-5,
    say: () => '36 000 g/kWh',
  }),
];

/**
 * The power in W that a set of injectors can feed: `flow · density · count · duty / bsfc`. An upper bound by fuel alone.
 * Source: the rule as quoted by a secondary page (19 lb/h, 4, 0.80, 0.50 → 121.6 hp).
 *
 * @param flow of one injector held open, m³/s, at the pressure it runs at (see `flowAtPressure`)
 */
export const powerFed = (flow: number, supply: Supply): Worked<number> =>
  work(
    [...numberProblem('flow', 'The flow of an injector', flow, FLOW), ...supplyProblems(supply)],
    'flow',
    () => (flow * supply.density * supply.count * (supply.dutyPercent / 100)) / supply.bsfc,
  );

/** The flow in m³/s that each injector must have for a power in W; `powerFed` the other way round. */
export function flowForPower(power: number, supply: Supply): Worked<number> {
  const problems = [
    ...numberProblem('power', 'The power', power, { least: 0, most: 1e8, say: (bound) => `${bound / 1e6} MW` }),
    ...supplyProblems(supply),
  ];
  return work(
    problems,
    'power',
    () => (power * supply.bsfc) / (supply.density * supply.count * (supply.dutyPercent / 100)),
  );
}
