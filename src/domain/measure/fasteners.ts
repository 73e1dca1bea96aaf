import type { ScrewThread } from './threads';
import { type Worked, numberProblem, refused, work, worked } from './worked';

/**
 * Stress area of a thread in m²: the area of a smooth rod that would break at the same load.
 * π/4·(d − 0.9382·P)² for metric threads (ISO 898-1:2013, 9.1.6.1, quoted), π/4·(D − 0.9743/n)² for unified
 * ones (ASME B1.1, from memory); diameter and pitch in m.
 */
export function stressArea({
  kind,
  diameter,
  pitch,
}: Pick<ScrewThread, 'kind' | 'diameter' | 'pitch'>): Worked<number> {
  const lost = (kind === 'metric' ? 0.9382 : 0.9743) * pitch;
  return work(
    [
      ...numberProblem('diameter', 'The diameter', diameter, { above: 0 }),
      ...numberProblem('pitch', 'The pitch', pitch, { above: 0 }),
      ...(lost >= diameter ? [{ field: 'pitch', message: 'The pitch leaves nothing of the diameter.' }] : []),
    ],
    'diameter',
    () => (Math.PI / 4) * (diameter - lost) ** 2,
  );
}

const MEGA = 1e6;
/** 1 ksi in Pa, from the exact pound, inch and g_n of convert.ts. */
const THOUSAND_PSI = (1000 * 0.45359237 * 9.80665) / 0.0254 ** 2;

interface Row {
  /** Largest nominal diameter in m for which `stress` holds. */
  upTo: number;
  /** Proof stress in Pa. */
  stress: number;
}

const iso = (...rows: [upTo: number, mpa: number][]): Row[] =>
  rows.map(([mm, mpa]) => ({ upTo: mm / 1000, stress: mpa * MEGA }));
const sae = (...rows: [upTo: number, ksi: number][]): Row[] =>
  rows.map(([inch, ksi]) => ({ upTo: inch * 0.0254, stress: ksi * THOUSAND_PSI }));

/**
 * Proof stress by property class of ISO 898-1, which covers M1.6 to M39 (9.8: to M16). 8.8 has two rows: 580 MPa to
 * M16, 600 MPa above. Quoted in secondary tables; the range from memory.
 */
const ISO_CLASSES: Readonly<Record<string, Row[]>> = {
  '4.6': iso([39, 225]),
  '4.8': iso([39, 310]),
  '5.8': iso([39, 380]),
  '8.8': iso([16, 580], [39, 600]),
  '9.8': iso([16, 650]),
  '10.9': iso([39, 830]),
  '12.9': iso([39, 970]),
};

/** Proof stress by grade of SAE J429, 1/4 to 1 1/2 in. Quoted in secondary tables. */
const SAE_GRADES: Readonly<Record<string, Row[]>> = {
  '1': sae([1.5, 33]),
  '2': sae([0.75, 55], [1.5, 33]),
  '5': sae([1, 85], [1.5, 74]),
  '8': sae([1.5, 120]),
};

export interface ProofStress {
  /** In Pa. */
  stress: number;
  /** "ISO 898-1 class 8.8", "SAE J429 grade 5". */
  standard: string;
}

const because = (message: string) => refused({ field: 'class', message });
const KNOWN = `known are ${Object.keys(ISO_CLASSES).join(', ')} of ISO 898-1 and SAE ${Object.keys(SAE_GRADES).join(', ')} of SAE J429`;

/** Says of a text that names no known class what it looks like. */
function unknown(text: string): string {
  if (text === '') return 'No property class is given; look at the head of the bolt.';
  if (/^A\d-\d{2}$/i.test(text))
    return `${text} is stainless steel by ISO 3506-1; the book holds no proof stress for it.`;
  if (/^\d{1,2}$/.test(text))
    return `"${text}" alone is the class of a nut or an inch grade; write 8.8 for a class, SAE ${text} for a grade.`;
  return `"${text.slice(0, 20)}" is no property class that the book knows; ${KNOWN}.`;
}

/**
 * Proof stress in Pa: what a bolt of this class must bear without staying longer afterwards.
 *
 * @param text the class as a sheet writes it: "8.8", "SAE 5" (also "grade 5")
 * @returns problems name `class`: a class that is not known, or that does not cover this kind or size of thread
 */
export function proofStress(
  text: string,
  { kind, diameter }: Pick<ScrewThread, 'kind' | 'diameter'>,
): Worked<ProofStress> {
  const problems = numberProblem('diameter', 'The diameter', diameter, { above: 0 });
  if (problems.length > 0) return refused(...problems);
  const name = typeof text === 'string' ? text.trim() : '';
  const grade = /^(?:SAE(?: J429)?(?: grade)?|grade) ?(\d(?:\.\d)?)$/i.exec(name)?.[1];
  const table = grade === undefined ? ISO_CLASSES : SAE_GRADES;
  const key = grade ?? /^(?:ISO |class )?(\d{1,2}\.\d)$/i.exec(name)?.[1] ?? '';
  const rows = Object.hasOwn(table, key) ? table[key] : undefined;
  if (!rows) return because(unknown(name));

  const standard = grade === undefined ? `ISO 898-1 class ${key}` : `SAE J429 grade ${key}`;
  if (grade === undefined && kind !== 'metric')
    return because(`${standard} is for metric threads; inch bolts have SAE grades.`);
  if (grade !== undefined && kind === 'metric')
    return because(`${standard} is for inch threads; metric bolts have ISO classes.`);
  const least = grade === undefined ? 1.6e-3 : 0.25 * 0.0254;
  // The smallest slip of floating point must not move a bolt of exactly 1 in into the row above it.
  const row = diameter < least * (1 - 1e-9) ? undefined : rows.find(({ upTo }) => diameter <= upTo * (1 + 1e-9));
  return row ? worked({ stress: row.stress, standard }) : because(`${standard} does not cover a bolt of this size.`);
}

export interface ProofLoad extends ProofStress {
  /** In N. */
  load: number;
  /** In m². */
  area: number;
}

/** Proof load in N, F_p = A_s·S_p. Source: ISO 898-1, which starts from stress areas rounded to three digits. */
export function proofLoad(thread: ScrewThread, propertyClass: string): Worked<ProofLoad> {
  const area = stressArea(thread);
  if (!area.ok) return area;
  const proof = proofStress(propertyClass, thread);
  if (!proof.ok) return proof;
  return worked({ ...proof.value, area: area.value, load: area.value * proof.value.stress });
}
