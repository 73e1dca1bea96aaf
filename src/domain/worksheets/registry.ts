import { bearingClearance } from './bearing-clearance/worksheet';
import { bore } from './bore/worksheet';
import { bucketShim } from './bucket-shim/worksheet';
import { clamp } from './clamp/worksheet';
import { compressionRatio } from './compression-ratio/worksheet';
import { compression } from './compression/worksheet';
import { depthOverBar } from './depth-over-bar/worksheet';
import { flatness } from './flatness/worksheet';
import { gaugeFit } from './gauge-fit/worksheet';
import { injectorSet } from './injector-set/worksheet';
import { leakDown } from './leak-down/worksheet';
import { ringGap } from './ring-gap/worksheet';
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
const ALL = [
  clamp,
  wrenchAdapter,
  tighteningOrder,
  gaugeFit,
  injectorSet,
  depthOverBar,
  bore,
  bearingClearance,
  ringGap,
  bucketShim,
  flatness,
  compressionRatio,
  compression,
  leakDown,
  viscosityGrade,
  vin,
  units,
] as const;

// Each computation takes the values of its own fields; from here on the two travel together, so that they always fit.
export const WORKSHEETS: readonly Worksheet[] = ALL as unknown as readonly Worksheet[];

export const worksheetNamed = (name: string | undefined): Worksheet | undefined =>
  WORKSHEETS.find((one) => one.name === name);
