import { clamp } from './clamp/worksheet';
import { gaugeFit } from './gauge-fit/worksheet';
import { tighteningOrder } from './tightening-order/worksheet';
import { units } from './units/worksheet';
import { vin } from './vin/worksheet';
import { viscosityGrade } from './viscosity-grade/worksheet';
import { wrenchAdapter } from './wrench-adapter/worksheet';
import type { Worksheet } from './worksheet';

/**
 * All worksheets, in the order of the handbook. A new one adds its folder and its line here, and is a calculator, a
 * call of the API and a table that a step can ask for.
 */
const ALL = [units, clamp, wrenchAdapter, tighteningOrder, gaugeFit, viscosityGrade, vin] as const;

// Each computation takes the values of its own fields; from here on the two travel together, so that they always fit.
export const WORKSHEETS: readonly Worksheet[] = ALL as unknown as readonly Worksheet[];

export const worksheetNamed = (name: string | undefined): Worksheet | undefined =>
  WORKSHEETS.find((one) => one.name === name);
