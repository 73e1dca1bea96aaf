import { PRESSURE, SOME_PRESSURE } from './reach';
import { numberProblem, work, type Worked } from './worked';

/**
 * The International Standard Atmosphere up to 11 km (ISO 2533): 101 325 Pa and 288.15 K at sea level, 6.5 K colder
 * for each km, p = p₀ · (1 − L·h / T₀)^(g / (R·L)). Constants from memory.
 */
const SEA_LEVEL = 101325;
const WARMTH = 288.15;
const LAPSE = 0.0065;
const EXPONENT = 9.80665 / (287.05287 * LAPSE);

/** From the shore of the Dead Sea to above every road. */
const ALTITUDE = { least: -500, most: 6000, say: (bound: number) => `${bound} m` };

/**
 * Pressure of the standard air at an altitude, Pa. The weather moves the true one by 3 % or so; where a barometer hangs
 * in the shop, its reading (not reduced to sea level) is better.
 *
 * @param altitude m above the sea, −500 to 6000
 */
export const standardPressure = (altitude: number): Worked<number> =>
  work(
    numberProblem('altitude', 'The altitude', altitude, ALTITUDE),
    'altitude',
    () => SEA_LEVEL * (1 - (LAPSE * altitude) / WARMTH) ** EXPONENT,
  );

/** The altitude in m at which the standard air has a pressure in Pa; `standardPressure` the other way round. */
export const standardAltitude = (pressure: number): Worked<number> =>
  work(
    numberProblem('pressure', 'The air pressure', pressure, {
      least: 47000,
      most: 108000,
      say: (bound) => `${bound / 1000} kPa`,
    }),
    'pressure',
    () => (WARMTH / LAPSE) * (1 - (pressure / SEA_LEVEL) ** (1 / EXPONENT)),
  );

/**
 * What a compression gauge would have shown at sea level, Pa, for a reading taken in thinner air: `reading · p₀ / ambient`.
 * The cylinder multiplies the absolute pressure it draws in, so the absolute reading scales with the air; for a gauge that
 * shows zero in the open the two airs cancel, (r + a)·p₀/a − p₀ = r·p₀/a. Warmth and throttle are left out.
 *
 * @param reading gauge pressure, Pa; see `gaugeFromAbsolute` for one that counts from vacuum
 * @param ambient pressure of the air around the engine, Pa
 */
export const atSeaLevel = (reading: number, ambient: number): Worked<number> =>
  work(
    [
      ...numberProblem('reading', 'The reading', reading, PRESSURE),
      ...numberProblem('ambient', 'The pressure of the air', ambient, SOME_PRESSURE),
    ],
    'reading',
    () => (reading * SEA_LEVEL) / ambient,
  );

/**
 * What a gauge that shows zero in the open would read, Pa, for a pressure counted from vacuum. A transducer that counts
 * from vacuum shows one air pressure more: held against a limit for gauges, it passes a cylinder that fails.
 */
export function gaugeFromAbsolute(absolute: number, ambient: number): Worked<number> {
  const problems = [
    ...numberProblem('absolute', 'The absolute pressure', absolute, PRESSURE),
    ...numberProblem('ambient', 'The pressure of the air', ambient, SOME_PRESSURE),
  ];
  if (problems.length === 0 && absolute < ambient)
    problems.push({ field: 'absolute', message: 'The absolute pressure cannot be less than that of the air.' });
  return work(problems, 'absolute', () => absolute - ambient);
}
