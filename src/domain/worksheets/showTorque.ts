import { formatMeasure, type BothUnits } from '../measure/format';
import { roundTo } from '../measure/round';

/** A torque that was worked out, in N·m, no finer than a wrench can be set: 24.2 N·m, 214 lbf·in. */
export const showTorque = (nm: number): BothUnits => ({
  metric: formatMeasure(roundTo(nm, nm < 2 ? 0.01 : nm < 100 ? 0.1 : 1), 'N·m').metric,
  // From the number as it is, not from the rounded one.
  inch: formatMeasure(nm, 'N·m').inch,
});
