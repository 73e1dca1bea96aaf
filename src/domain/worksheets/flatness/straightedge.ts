import type { LocalVerdict } from '../../measure/flatness';
import { DIRECTIONS, judgeFlatness, type Direction } from '../../measure/flatness';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, inShort, judgedFinding, lookAgain, measured, verdictOf, type Finding } from '../findings';
import { worst, type Result, type Verdict } from '../outcome';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Feeler gauges step in hundredths of a mm. */
const FINE = 0.01;
const mm = (metres: number) => show(metres, 'mm', FINE);
const LOCAL: Record<LocalVerdict, Verdict> = { in: 'pass', unsure: 'look', over: 'fail' };
const WAYS: Record<Direction, string> = { along: 'along', across: 'across', diagonal: 'diagonally' };

function localOf({ local, over }: Inputs): Worked<{ max: number; over: number } | undefined> {
  if (!local) return worked(undefined);
  if (local.max === undefined)
    return refused({ field: 'local.max', message: 'Allowed in any stretch: give the most.' });
  if (over === undefined) return refused({ field: 'over', message: 'Say how long the stretch of the limit is.' });
  return worked({ max: local.max, over });
}

/** The gaps against the limits of their directions and of a stretch; see `measure/flatness.ts`. */
export function straightedge(inputs: Inputs): Worked<{ findings: Finding[]; results: Result[] }> {
  if (inputs.gaps.length === 0) return worked({ findings: [], results: [] });
  const local = localOf(inputs);
  if (!local.ok) return local;
  const limits = Object.fromEntries(DIRECTIONS.map((one) => [one, inputs[one] ?? inputs.every]));
  const found = judgeFlatness(inputs.gaps, { ...limits, local: local.value });
  if (!found.ok)
    return inBoxes(found, {
      ...Object.fromEntries(DIRECTIONS.map((one) => [`limits.${one}`, inputs[one] ? one : 'every'])),
      'limits.local.max': 'local.max',
      'limits.local.over': 'over',
    });

  const findings = found.value.gaps.flatMap(({ gap, judged, local: inStretch }, place): Finding[] => {
    const { direction = 'along', span } = inputs.gaps[place] ?? {};
    return [
      ...judgedFinding({
        subject: `Gap ${place + 1}, ${WAYS[direction]}, is`,
        value: gap,
        judged,
        band: limits[direction],
        unit: 'mm',
        fineness: FINE,
      }),
      ...(inStretch && local.value ? [stretch(place, gap, span, inStretch, local.value)] : []),
    ];
  });
  const short = inShort(findings, said`Every gap is within its limits; the largest is ${mm(found.value.worstOfAll)}.`);
  const results = DIRECTIONS.flatMap((direction) => {
    const largest = found.value.worst[direction];
    if (largest === null) return [];
    const verdicts = found.value.gaps
      .filter((_, place) => inputs.gaps[place]?.direction === direction)
      .flatMap(({ judged, local: inStretch }) => [verdictOf(judged), inStretch ? LOCAL[inStretch] : undefined]);
    const verdict = worst(verdicts);
    return measured(direction, `Largest gap ${WAYS[direction]}`, largest, 'mm', FINE, {
      main: true,
      ...(verdict !== 'none' && { verdict }),
      source: 'Straightedge and feeler gauge: common practice, no published source.',
    });
  });
  return worked({ findings: short, results });
}

function stretch(
  place: number,
  gap: number,
  span: number | undefined,
  verdict: LocalVerdict,
  limit: { max: number; over: number },
): Finding {
  const length = show(limit.over, 'mm', 1);
  const rests = span === undefined ? said`` : said` between rests ${show(span, 'mm', 1)} apart`;
  const what = said`Gap ${place + 1} is ${mm(gap)}${rests}`;
  const most = said`${mm(limit.max)} in ${length} is the most allowed`;
  if (verdict === 'unsure')
    return lookAgain(said`${what}; ${most}. Go along it with a straightedge of ${length} or less to tell.`);
  return verdict === 'over'
    ? { verdict: 'fail', text: said`${what}, too much: ${most}.` }
    : { verdict: 'pass', text: said`${what}; ${most}.` };
}
