import type { Torque } from '../procedure/schema';

/** State of the thread while it is tightened: the schema's CONDITIONS. */
export type Condition = Torque['condition'];

export interface NutFactor {
  /** K of T = K·d·F; no unit. */
  k: number;
  /** Where the figure comes from, for the screen. */
  origin: string;
}

const SHIGLEY = "Shigley's Mechanical Engineering Design, 9th edition, table 8-15";

/**
 * Nut factor by condition. Ten bolts of one batch at one torque have clamped 11 % less to 18 % more than their mean
 * (Shigley, table 8-14), so nothing that is reckoned with K is better than that.
 */
export const NUT_FACTORS: Readonly<Record<Condition, NutFactor>> = {
  dry: { k: 0.2, origin: 'Cleaned and dry, quoted in a secondary work; the same as zinc plated in Shigley' },
  oiled: { k: 0.18, origin: `Lubricated, ${SHIGLEY}` },
  // Secondary works disagree on whether wet threadlocker eases or hinders; the lower K gives the higher clamp load,
  // so that the check errs towards "over".
  threadlocker: { k: 0.18, origin: 'Wet while tightened, so taken as lubricated: common practice, no source' },
  sealant: { k: 0.18, origin: 'Wet while tightened, so taken as lubricated: common practice, no source' },
  'anti-seize': { k: 0.12, origin: `With anti-seize, ${SHIGLEY}` },
};
