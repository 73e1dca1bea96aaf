/**
 * Rounding, once, at the very end: a value is stored and converted at full precision, and only the text that
 * somebody reads is rounded to what their tool can show. Half goes away from zero, as at the bench.
 */

/** Decimal places that a step needs to be written: 2 for 0.05, 0 for 5. */
export function decimalsOf(step: number): number {
  const [digits = '', power = '0'] = String(Math.abs(step)).split('e');
  const fraction = digits.split('.')[1]?.length ?? 0;
  return Math.max(0, fraction - Number(power));
}

/**
 * `value` to the nearest multiple of `resolution`, half away from zero. Both in the same unit.
 * A value within a few parts in 10^15 of the half counts as the half: 1.005 to 0.01 is 1.01 although its nearest
 * binary number lies a hair below.
 *
 * @throws RangeError where the value is no number or the resolution is not more than zero
 */
export function roundTo(value: number, resolution: number): number {
  if (!Number.isFinite(value)) throw new RangeError('The value to round must be a number.');
  if (!(resolution > 0) || !Number.isFinite(resolution))
    throw new RangeError('The resolution to round to must be more than zero.');
  const steps = Math.abs(value) / resolution;
  // So many steps are finer than the number itself can tell apart; there is nothing to round.
  if (steps > 2 ** 48) return value;
  const whole = Math.floor(steps * (1 + 4 * Number.EPSILON) + 0.5);
  const magnitude = Number((whole * resolution).toFixed(Math.min(100, decimalsOf(resolution))));
  return magnitude === 0 ? 0 : Math.sign(value) * magnitude;
}
