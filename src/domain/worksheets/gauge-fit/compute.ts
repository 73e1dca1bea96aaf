import { fromBase } from '../../measure/convert';
import { formatNumber } from '../../measure/format';
import { IDEAL_RATIO, LEAST_RATIO, WHOLE_BAND, gaugeFit, gaugeFor, type GaugeFit } from '../../measure/gaugeFit';
import { said, show } from '../../measure/said';
import { type Worked, refused, worked } from '../../measure/worked';
import type { Values } from '../fields';
import type { Outcome, Result, Verdict } from '../outcome';
import type { fields } from './schema';

const SOURCE = `${IDEAL_RATIO} to 1: National Physical Laboratory, FAQ on ISO 14253-1, and MIL-M-45945A. ${LEAST_RATIO} to 1: MIL-STD-1839, 5.4.3, as quoted in MIL-HDBK-1839.`;

const VERDICTS: Readonly<Record<GaugeFit['verdict'], Verdict>> = {
  ideal: 'pass',
  enough: 'pass',
  'too coarse': 'look',
};
const step = (metres: number) => show(metres, 'mm');

/** The usual tool in the reader's own unit. */
function reachFor(key: string, label: string, which: 'ideal' | 'least', band: number): Result[] {
  const [mm, inch] = [gaugeFor(band, 'mm'), gaugeFor(band, 'in')];
  if (!mm.ok || !inch.ok) return [];
  const none = 'none that is usual';
  const found = mm.value[which];
  return [
    {
      key,
      label,
      value: found ? fromBase(found.resolution, 'mm') : null,
      unit: found ? 'mm' : null,
      text: { metric: found?.text ?? none, inch: inch.value[which]?.text ?? none },
    },
  ];
}

/** Whether a measuring tool is fine enough for a limit, and which one would be. */
export function compute({ tolerance, resolution, uncertainty }: Values<typeof fields>): Worked<Outcome> {
  const { min, max } = tolerance;
  if (min === undefined || max === undefined)
    return refused({
      field: min === undefined ? 'tolerance.min' : 'tolerance.max',
      message: 'The limit must have a least and a most; with one end open there is no tolerance to fit a tool to.',
    });
  const band = max - min;
  // Twelve digits: a subtraction of 20.05 and 19.95 must not make a tolerance of 0.10000000000000142 mm.
  const width = Number(band.toPrecision(12));
  if (!(width > 0)) return refused({ field: 'tolerance.max', message: 'The most must be more than the least.' });
  const whole: Result = {
    key: 'tolerance',
    label: 'Whole tolerance',
    value: fromBase(width, 'mm'),
    unit: 'mm',
    text: step(width),
  };
  const tools = [
    ...reachFor('ideal-tool', `Coarsest usual tool for ${IDEAL_RATIO} to 1`, 'ideal', width),
    ...reachFor('least-tool', `Coarsest usual tool for ${LEAST_RATIO} to 1`, 'least', width),
  ];
  const told = tools.map(({ text }) => text);
  const advice = said`For ${IDEAL_RATIO} to 1 take a tool that reads ${told[0] ?? ''}, for ${LEAST_RATIO} to 1 one that reads ${told[1] ?? ''}.`;
  if (resolution === undefined && uncertainty === undefined)
    return worked({ verdict: 'none', reasons: [advice, said`${WHOLE_BAND}`], results: [whole, ...tools], charts: [] });

  const tool = Math.max(resolution ?? 0, uncertainty ?? 0);
  const fit = gaugeFit(width, tool);
  if (!fit.ok)
    return refused({
      field: resolution === tool ? 'resolution' : 'uncertainty',
      message: fit.problems[0]?.message ?? '',
    });
  const ratio = `${formatNumber(fit.value.ratio, fit.value.ratio < 20 ? 1 : 0)} to 1`;
  const verdict = VERDICTS[fit.value.verdict];
  const main: Result = {
    key: 'ratio',
    label: 'Tolerance to tool',
    value: fit.value.ratio,
    unit: ':1',
    text: { metric: ratio, inch: ratio },
    verdict,
    formula: said`${step(width)} / ${step(tool)} = ${ratio}`,
    source: SOURCE,
    main: true,
  };
  const reasons = [said`${fit.value.why}`, ...(fit.value.verdict === 'ideal' ? [] : [advice])];
  return worked({ verdict, reasons, results: [main, whole, ...tools], charts: [] });
}
