import { type Worked, numberProblem, work } from './worked';

/** One row of SAE J300; kinematic viscosity at 100 °C in mm²/s. */
export interface Grade {
  grade: string;
  least: number;
  /** Exclusive. */
  below: number;
  /** Least viscosity at 150 °C and high shear in mPa·s, with the grades it is for where there are two. */
  highShear: string;
}

/**
 * SAE J300, January 2015, as quoted in two secondary works that agree. 8, 12, 16 and 20 overlap on purpose. Older
 * tables differ: the one of 1999 begins 20 at 5.6 and has no grade below it.
 */
export const GRADES: readonly Grade[] = [
  { grade: '8', least: 4.0, below: 6.1, highShear: '1.7' },
  { grade: '12', least: 5.0, below: 7.1, highShear: '2.0' },
  { grade: '16', least: 6.1, below: 8.2, highShear: '2.3' },
  { grade: '20', least: 6.9, below: 9.3, highShear: '2.6' },
  { grade: '30', least: 9.3, below: 12.5, highShear: '2.9' },
  { grade: '40', least: 12.5, below: 16.3, highShear: '3.5 for 0W, 5W and 10W-40, 3.7 for all other 40' },
  { grade: '50', least: 16.3, below: 21.9, highShear: '3.7' },
  { grade: '60', least: 21.9, below: 26.1, highShear: '3.7' },
];

/** Least kinematic viscosity at 100 °C of the winter grades, in mm²/s. SAE J300, January 2015, quoted. */
const WINTER: readonly (readonly [grade: string, least: number])[] = [
  ['0W', 3.8],
  ['5W', 3.8],
  ['10W', 4.1],
  ['15W', 5.6],
  ['20W', 5.6],
  ['25W', 9.3],
];

export interface ViscosityGrades {
  /** Every grade whose range holds the viscosity, thinnest first; empty below 4.0, from 26.1 on. */
  fits: { grade: string; highShear: string }[];
  /** Winter grades whose least viscosity at 100 °C is reached. Whether the oil is one of them is decided in the cold. */
  winter: string[];
  /** One sentence for the screen. */
  says: string;
}

export const ONLY_KINEMATIC =
  'This looks at one figure of SAE J300. High shear at 150 °C and the cold tests decide too, and a used oil may have left its grade.';

/**
 * The SAE grades that a kinematic viscosity at 100 °C falls into.
 *
 * @param viscosity in m²/s (1 mm²/s, or 1 cSt, is 1e-6)
 * @returns problems name `viscosity`, which must be more than zero
 *
 * Source: SAE J300, January 2015; upper bounds are exclusive.
 */
export function viscosityGrades(viscosity: number): Worked<ViscosityGrades> {
  return work(numberProblem('viscosity', 'The viscosity', viscosity, { above: 0 }), 'viscosity', () => {
    // Through m²/s, 9.3 mm²/s comes back as 9.299999999999999; twelve digits are far more than any viscometer has.
    const mm2 = Number((viscosity * 1e6).toPrecision(12));
    const fits = GRADES.filter(({ least, below }) => mm2 >= least && mm2 < below);
    const names = fits.map(({ grade }) => `SAE ${grade}`);
    const says =
      names.length > 1
        ? `Fits ${names.slice(0, -1).join(', ')} and ${names.at(-1)}; these grades overlap.`
        : names.length === 1
          ? `Fits ${names[0]}.`
          : mm2 < 4
            ? 'Thinner than every grade of SAE J300.'
            : 'Thicker than every grade of SAE J300.';
    return {
      fits: fits.map(({ grade, highShear }) => ({ grade, highShear })),
      winter: WINTER.filter(([, least]) => mm2 >= least).map(([grade]) => grade),
      says,
    };
  });
}
