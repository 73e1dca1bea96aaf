import { placeIn } from '../../measure/band';
import { judgeRingGaps } from '../../measure/rings';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { allowed, inBoxes, inShort, lookAgain, measured, noted, outcomeOf, verdictOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import { factorResult, gapShift, gapWanted } from './byBore';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Feeler gauges step in hundredths of a mm. */
const FINE = 0.01;
const mm = (metres: number) => show(metres, 'mm', FINE);

const RINGS = [
  { ring: 'top', words: 'top ring', limit: 'top' },
  { ring: 'second', words: 'second ring', limit: 'second' },
  { ring: 'upper', words: 'upper rail', limit: 'rail' },
  { ring: 'lower', words: 'lower rail', limit: 'rail' },
] as const;

interface Ring {
  key: string;
  who: string;
  /** Path of its box. */
  box: string;
  /** As it was read, m. */
  read: number;
  limit: 'top' | 'second' | 'rail';
}

const ringsOf = ({ cylinders }: Inputs): Ring[] =>
  cylinders.flatMap((row, place) =>
    RINGS.flatMap(({ ring, words, limit }) => {
      const read = row[ring];
      const who = `${words} of cylinder ${place + 1}`;
      return read === undefined
        ? []
        : [{ key: `${ring}-${place + 1}`, who, box: `cylinders.${place}.${ring}`, read, limit }];
    }),
  );

/** Gaps against their limits; see `measure/rings.ts`. The factor is a rule of thumb: a gap under it is looked at again. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const shift = gapShift(inputs);
  if (!shift.ok) return shift;
  const wanted = gapWanted(inputs);
  if (!wanted.ok) return wanted;
  const rings = ringsOf(inputs);
  if (rings.length === 0) return refused({ field: 'cylinders.0.top', message: 'End gaps: fill in at least one ring.' });

  const findings: Finding[] = [];
  const results: Result[] = wanted.value === null ? [] : [factorResult(inputs, wanted.value)];
  for (const ring of rings) {
    const one = oneRing(inputs, ring, shift.value, wanted.value);
    if (!one.ok) return one;
    findings.push(...one.value.findings);
    results.push(one.value.result);
  }
  const short = inShort(
    findings,
    findings.length === 1 ? said`The ring passes.` : said`All ${findings.length} rings that have a limit pass.`,
  );
  return outcomeOf(short.length > 0 ? short : [noted(said`Worked out; no limit was given for these rings.`)], results);
}

function oneRing(
  inputs: Inputs,
  { key, who, box, read, limit }: Ring,
  shift: number,
  wanted: number | null,
): Worked<{ findings: Finding[]; result: Result }> {
  const band = inputs[limit];
  const gap = read + shift;
  const meets = gap < 0;
  const found = judgeRingGaps({ gaps: [Math.max(0, gap)], band });
  if (!found.ok) return inBoxes(found, { band: limit, 'gaps.0': box });
  const judged = found.value.gaps[0]?.judged ?? null;
  const findings: Finding[] = [];
  if (meets)
    findings.push({
      verdict: 'fail',
      text: said`The ends of the ${who} would meet: its gap of ${mm(read)} loses ${mm(-shift)} in the smaller bore.`,
    });
  else if (judged && band) findings.push(judgedRing(who, gap, judged, said`${allowed(band, 'mm', FINE)}`));
  else if (limit === 'top' && wanted !== null && placeIn(gap, { min: wanted }).at === 'under')
    findings.push(
      lookAgain(said`The ${who} has a gap of ${mm(gap)}; by the factor it should have ${mm(wanted)} or more.`),
    );
  const verdict = meets ? 'fail' : verdictOf(judged);
  return worked({
    findings,
    result: measured(key, `End gap, ${who}`, gap, 'mm', FINE, {
      verdict,
      // Of many rings, those that fail are what people came for.
      ...(verdict === 'fail' && { main: true }),
      ...(shift !== 0 && {
        formula: said`gap + π · (bore it runs in − bore measured in) = ${mm(read)} + (${show(shift, 'mm', 0.001)}) = ${mm(gap)}`,
        source: 'The ring lies along the circumference: geometry.',
      }),
    }),
  });
}

function judgedRing(
  who: string,
  gap: number,
  { at, by }: { at: string; by: number },
  limit: ReturnType<typeof mm>,
): Finding {
  const opening = said`The ${who} has a gap of ${mm(gap)}`;
  if (at === 'in') return { verdict: 'pass', text: said`${opening}; ${limit}.` };
  if (at === 'under')
    return { verdict: 'fail', text: said`${opening}, too little: file ${mm(by)} or more off its ends; ${limit}.` };
  return { verdict: 'fail', text: said`${opening}, too much: ${limit}. Check the bore before you blame the ring.` };
}
