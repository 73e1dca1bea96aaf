import { clampCheck, type ClampCheck } from '../measure/clampLoad';
import { formatNumber, type BothUnits } from '../measure/format';
import { said, show } from '../measure/said';
import { mixUpOfSize } from '../measure/unitMixUp';
import type { Torque } from './schema';

/** The clamp check of a sheet's torque, as sheet, check and review desk show it. */

/** Said where a thread cannot be reckoned with. */
export const OUT_OF_TABLES = 'This thread is in no table that the check goes by.';

const inputOf = ({ nm, thread, pitch, class: strength, condition, angles }: Torque) => ({
  nm,
  thread,
  condition,
  ...(pitch !== undefined && { pitch }),
  ...(strength !== undefined && { class: strength }),
  ...(angles !== undefined && { angles }),
});

/** Null where the thread cannot be reckoned with at all, such as a size outside the standards' tables. */
export function clampOf(torque: Torque): ClampCheck | null {
  const check = clampCheck(inputOf(torque));
  return check.ok ? check.value : null;
}

/** Which unit the figure may really have been in, where it cannot be right for its fastener; null where it can. */
export function sizeMixUp(torque: Torque): string | null {
  const found = mixUpOfSize(inputOf(torque));
  return found.ok ? (found.value?.says ?? null) : null;
}

/** "72 %": of proof load, to a whole per cent; finer below ten. */
export const shareText = (share: number): string => `${formatNumber(share * 100, share < 0.1 ? 1 : 0)} %`;

/** "8.3 kN, 72 % of proof load"; only the load where the class is not known; null where there is neither. */
export function clampText({ clampLoad, share }: ClampCheck): BothUnits | null {
  if (clampLoad === null) return null;
  const load = show(clampLoad, 'kN', 0.1);
  return share === null ? load : said`${load}, ${shareText(share)} of proof load`;
}

/** One torque of a sheet, checked. */
export interface CheckedTorque {
  key: string;
  name: string;
  /** `torques.0` */
  path: string;
  verdict: ClampCheck['verdict'];
  message: string;
  /** In N. */
  clampLoad: number | null;
  /** In N. */
  proofLoad: number | null;
  share: number | null;
  nutFactor: number | null;
  mixUp: string | null;
}

/** Every torque of a sheet, checked against its fastener. */
export const clampChecks = (torques: readonly Torque[]): CheckedTorque[] =>
  torques.map((torque, i) => {
    const { key, name } = torque;
    const check = clampOf(torque);
    const at = { key, name, path: `torques.${i}` };
    if (!check)
      return {
        ...at,
        verdict: 'unknown',
        message: OUT_OF_TABLES,
        clampLoad: null,
        proofLoad: null,
        share: null,
        nutFactor: null,
        mixUp: null,
      };
    const { verdict, why, clampLoad, proof, share, nutFactor } = check;
    return {
      ...at,
      verdict,
      message: why,
      clampLoad,
      proofLoad: proof?.load ?? null,
      share,
      nutFactor: nutFactor?.k ?? null,
      mixUp: sizeMixUp(torque),
    };
  });
