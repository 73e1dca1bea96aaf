import { fromBase } from '../../measure/convert';
import { formatNumber } from '../../measure/format';
import { said, show } from '../../measure/said';
import { GRADES, ONLY_KINEMATIC, viscosityGrades } from '../../measure/viscosityGrade';
import { type Worked, worked } from '../../measure/worked';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';

const SOURCE = 'SAE J300, January 2015, as quoted in two secondary works that agree';

/** The SAE grades that a viscosity at 100 °C falls into, and whether the one on the can is among them. */
export function compute({ viscosity, grade }: Values<typeof fields>): Worked<Outcome> {
  const found = viscosityGrades(viscosity);
  if (!found.ok) return found;
  const { fits, winter, says } = found.value;
  const measured = show(viscosity, 'mm²/s', 0.01);
  const main: Result = {
    key: 'grades',
    label: 'SAE grades that hold it',
    value: null,
    unit: null,
    text: said`${fits.length === 0 ? 'None' : `SAE ${fits.map((fit) => fit.grade).join(', ')}`}`,
    source: SOURCE,
    main: true,
  };
  const results: Result[] = [
    main,
    {
      key: 'viscosity',
      label: 'Viscosity at 100 °C',
      value: fromBase(viscosity, 'mm²/s'),
      unit: 'mm²/s',
      text: measured,
    },
    ...fits.map(({ grade: name, highShear }) => ({
      key: `high-shear-${name}`,
      label: `SAE ${name} also needs, at 150 °C and high shear`,
      value: null,
      unit: null,
      text: said`at least ${highShear} mPa·s`,
    })),
    {
      key: 'winter',
      label: 'Winter grades whose least at 100 °C is reached',
      value: null,
      unit: null,
      text: said`${winter.length === 0 ? 'none' : winter.join(', ')}`,
    },
  ];
  const range = GRADES.find((one) => one.grade === grade);
  const isIn = fits.some((fit) => fit.grade === grade);
  const onCan = range
    ? [
        said`${measured} is ${isIn ? 'in' : 'outside'} SAE ${range.grade}, which runs from ${formatNumber(range.least)} to below ${formatNumber(range.below)} mm²/s.`,
      ]
    : [];
  return worked({
    verdict: range ? (isIn ? 'pass' : 'fail') : 'none',
    // One grade that is on the can as well need not be named twice.
    reasons: [...onCan, ...(isIn && fits.length === 1 ? [] : [said`${says}`]), said`${ONLY_KINEMATIC}`],
    results: range ? results.map((one) => (one === main ? { ...one, verdict: isIn ? 'pass' : 'fail' } : one)) : results,
    charts: [],
  });
}
