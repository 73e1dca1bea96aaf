import type { Bounds } from './worked';

/**
 * How far the quantities of an engine shop reach, far beyond any of its engines. A number outside is a slip of the
 * unit (82 mm handed over as 82 m), and is refused before it becomes an answer. All in SI base units.
 */
const metres = (bound: number) => `${bound} m`;
const pascals = (bound: number) => `${bound / 1e6} MPa`;
const cubicMetres = (bound: number) => `${bound * 1000} L`;
const percent = (bound: number) => `${bound} %`;

/** A size that cannot be nothing: a diameter, a thickness. */
export const SIZE: Bounds = { above: 0, most: 10, say: metres };
/** A gap or a clearance that may be nothing, but not less. */
export const GAP: Bounds = { least: 0, most: 10, say: metres };
/** A distance that may run either way from a face. */
export const OFFSET: Bounds = { least: -10, most: 10, say: metres };
/** A gauge pressure of nothing or more. */
export const PRESSURE: Bounds = { least: 0, most: 1e9, say: pascals };
/** A pressure that something must be divided by. */
export const SOME_PRESSURE: Bounds = { above: 0, most: 1e9, say: pascals };
/** A volume flow; a blocked injector flows nothing. */
export const FLOW: Bounds = { least: 0, most: 1, say: (bound) => `${bound} m³/s` };
export const VOLUME: Bounds = { least: 0, most: 1, say: cubicMetres };
/** A tolerance given as a share. */
export const TOLERANCE_PERCENT: Bounds = { least: 0, most: 100, say: percent };
/** A share that something is made of, and that it may be divided by. */
export const SHARE_PERCENT: Bounds = { above: 0, most: 100, say: percent };
