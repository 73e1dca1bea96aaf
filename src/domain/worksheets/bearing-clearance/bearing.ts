import { placeInIfAny } from '../../measure/band';
import { bearingClearance, clearanceFromShells } from '../../measure/bearings';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, measured, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

/** Micrometers for journals read to a thousandth, in mm. */
export const FINE = 0.001;
const mm = (metres: number) => show(metres, 'mm', FINE);

const MEASURED = 'Bearing bore less journal, cap tightened: TM 9-2815-254-24 §f.';
const BUILT = 'Housing less two shell walls less journal: geometry; the crush of the shells is left out.';

interface OneBearing {
  /** m */
  clearance: number;
  findings: Finding[];
  results: Result[];
}

/** One row: its clearance, and its sizes against theirs. A shell wall says that the bore was measured without shells. */
export function oneBearing(inputs: Values<typeof fields>, place: number): Worked<OneBearing> {
  const row = inputs.bearings[place];
  const at = `bearings.${place}`;
  if (!row) return refused({ field: at, message: `Bearing ${place + 1} is missing.` });
  const { bore, shell, journal } = row;
  const band = inputs.clearance;
  const found =
    shell === undefined
      ? bearingClearance({ bore: [bore], journal: [journal], band })
      : clearanceFromShells({ housing: [bore], shell: [shell], journal: [journal], band });
  if (!found.ok)
    return inBoxes(found, {
      band: 'clearance',
      'bore.0': `${at}.bore`,
      'housing.0': `${at}.bore`,
      bore: `${at}.bore`,
      housing: `${at}.bore`,
      'shell.0': `${at}.shell`,
      shell: `${at}.shell`,
      'journal.0': `${at}.journal`,
    });

  const { mean: clearance, judged } = found.value;
  const fitted = shell === undefined ? bore : bore - 2 * shell;
  const who = `bearing ${place + 1}`;
  const say = { unit: 'mm', fineness: FINE } as const;
  return worked({
    clearance,
    findings: [
      ...judgedFinding({ subject: `The oil clearance of ${who} is`, value: clearance, judged, band, ...say }),
      ...judgedFinding({
        subject: `The bore of ${who} is`,
        value: fitted,
        judged: placeInIfAny(fitted, inputs.bore, bore),
        band: inputs.bore,
        ...say,
      }),
      ...judgedFinding({
        subject: `The journal of ${who} is`,
        value: journal,
        judged: placeInIfAny(journal, inputs.journal),
        band: inputs.journal,
        ...say,
      }),
    ],
    results: [
      measured(`clearance-${place + 1}`, `Oil clearance, ${who}`, clearance, 'mm', FINE, {
        verdict: verdictOf(judged),
        formula:
          shell === undefined
            ? said`bore − journal = ${mm(bore)} − ${mm(journal)} = ${mm(clearance)}`
            : said`housing − 2 · shell − journal = ${mm(bore)} − 2 · ${mm(shell)} − ${mm(journal)} = ${mm(clearance)}`,
        source: shell === undefined ? MEASURED : BUILT,
        main: true,
      }),
    ],
  });
}
