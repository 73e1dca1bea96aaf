import type { Judged } from '../measure/band';
import { fromBase, type Unit } from '../measure/convert';
import { inBothUnits, withUnit, type BothUnits } from '../measure/format';
import { roundTo } from '../measure/round';
import { said, show } from '../measure/said';
import { refused, worked, type Worked } from '../measure/worked';
import type { Chart } from './charts';
import type { Band } from './fields';
import { worst, type Outcome, type Result, type Verdict } from './outcome';

/** One thing that was found, with how grave it is. */
export interface Finding {
  verdict: Verdict;
  text: BothUnits;
}

const GRAVEST: readonly Verdict[] = ['fail', 'look', 'pass', 'none'];

/** An outcome of findings: its verdict is the gravest of theirs, and its reasons stand in that order. */
export const outcomeOf = (
  findings: readonly Finding[],
  results: readonly Result[],
  charts: readonly Chart[] = [],
): Worked<Outcome> =>
  worked({
    verdict: worst(findings.map(({ verdict }) => verdict)),
    reasons: GRAVEST.flatMap((verdict) => findings.filter((one) => one.verdict === verdict)).map(({ text }) => text),
    results: [...results],
    charts: [...charts],
  });

/** The verdict of a value that was judged; none where there was nothing to judge it by. */
export const verdictOf = (judged: Judged | null | undefined): Verdict | undefined =>
  judged ? (judged.at === 'in' ? 'pass' : 'fail') : undefined;

/** A number among the results; `base` in the base unit, `fineness` in `unit`. */
export const measured = (
  key: string,
  label: string,
  base: number,
  unit: Unit,
  fineness: number,
  more: Pick<Result, 'verdict' | 'formula' | 'source' | 'main'> = {},
): Result => ({ key, label, value: fromBase(base, unit), unit, text: show(base, unit, fineness), ...more });

/** As many digits as somebody typed, but none of the slips of binary numbers. */
const typed = (base: number, unit: Unit) => Number(fromBase(base, unit).toPrecision(12));

/**
 * A limit in words that end a sentence: "0.025 to 0.055 mm is allowed", "the most allowed is 0.05 mm". It is written as
 * fine as the value beside it, or one digit finer where it was given so.
 */
export function allowed({ min, max }: Band, unit: Unit, fineness: number): BothUnits {
  const ends = [min, max].flatMap((end) => (end === undefined ? [] : [typed(end, unit)]));
  const fits = ends.every((end) => Math.abs(roundTo(end, fineness) - end) < fineness / 1000);
  const step = fits ? fineness : fineness / 10;
  const { metric, inch } = inBothUnits(ends, unit, step);
  const words = ({ numbers: [first = '', second = first], unit: shown }: typeof metric) => {
    if (ends.length < 2) return `the ${min === undefined ? 'most' : 'least'} allowed is ${withUnit(first, shown)}`;
    return first === second
      ? `${withUnit(first, shown)} is wanted`
      : `${first} to ${withUnit(second, shown)} is allowed`;
  };
  return { metric: words(metric), inch: words(inch) };
}

/** Finer where a value that failed would read like its limit: "15.3 %, too much: the most allowed is 15.0 %", never 15 % twice. */
function fineEnough(value: number, limit: number | undefined, unit: Unit, fineness: number, { at }: Judged): number {
  if (at === 'in' || limit === undefined) return fineness;
  const alike = (step: number) => {
    const [one, other] = [show(value, unit, step), show(limit, unit, step)];
    return one.metric === other.metric || one.inch === other.inch;
  };
  return [1, 10, 100, 1000].map((times) => fineness / times).find((step) => !alike(step)) ?? fineness / 1000;
}

interface ToSay {
  /** "The gap is", "Injector 3 flows". */
  subject: string;
  /** In the base unit. */
  value: number;
  judged: Judged | null | undefined;
  band: Band | undefined;
  unit: Unit;
  /** Step to round to, in `unit`. */
  fineness: number;
}

/** The finding of a value that may have been judged: "Taper is 0.018 mm, too much: the most allowed is 0.015 mm." */
export function judgedFinding({ subject, value, judged, band, unit, fineness }: ToSay): Finding[] {
  if (!judged || !band) return [];
  const step = fineEnough(value, judged.at === 'under' ? band.min : band.max, unit, fineness, judged);
  const limit = allowed(band, unit, step);
  const shown = show(value, unit, step);
  const joint = { in: '; ', under: ', too little: ', over: ', too much: ' }[judged.at];
  return [{ verdict: judged.at === 'in' ? 'pass' : 'fail', text: said`${subject} ${shown}${joint}${limit}.` }];
}

/** Of many alike: where all pass, one sentence for all of them, else only what does not pass. */
export function inShort(findings: readonly Finding[], allPass: BothUnits): Finding[] {
  if (findings.every(({ verdict }) => verdict === 'none')) return [...findings];
  const rest = findings.filter(({ verdict }) => verdict !== 'pass');
  return rest.some(({ verdict }) => verdict !== 'none') ? rest : [{ verdict: 'pass', text: allPass }, ...rest];
}

export const noted = (text: BothUnits): Finding => ({ verdict: 'none', text });
export const lookAgain = (text: BothUnits): Finding => ({ verdict: 'look', text });

/**
 * A refusal with the names of the worksheet's boxes in place of the computation's: `{ 'limits.taper': 'taper' }` turns
 * `limits.taper.max` into `taper.max`. The longest name that fits counts.
 */
export function inBoxes(problems: Extract<Worked<unknown>, { ok: false }>, names: Readonly<Record<string, string>>) {
  const known = Object.keys(names).sort((a, b) => b.length - a.length);
  return refused(
    ...problems.problems.map(({ field, message }) => {
      const name = known.find((one) => field === one || field.startsWith(`${one}.`));
      return { field: name === undefined ? field : (names[name] ?? name) + field.slice(name.length), message };
    }),
  );
}
