import { judgeCompression, type CompressionFound, type CompressionRules } from '../../measure/compression';
import { said, show } from '../../measure/said';
import type { Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, inShort, judgedFinding, measured, noted, outcomeOf, verdictOf, type Finding } from '../findings';
import { worst, type Outcome, type Result } from '../outcome';
import { airOf, gaugeReadings } from './readings';
import type { fields } from './schema';
import { wetFindings } from './wet';

type Inputs = Values<typeof fields>;

/** Gauges read to 10 or 20 kPa. */
const FINE = 10;
const kPa = (pascals: number) => show(pascals, 'kPa', FINE);
const SOURCES = {
  share: 'Lowest at least 75 % of the highest: TM 5-4210-230-14&P-1, Add. 2.',
  average: '20 % below the average: TM 1-1500-204-23-1 (aircraft).',
  difference: '10 psi between cylinders: TM 10-3930-618-20.',
};

/** The sheet's share goes before the rule of the shop. */
function rulesOf({ compression, share, rule, leastShare, mostBelow, mostDifference }: Inputs): CompressionRules {
  if (share || rule === 'share') return { band: compression, lowestOfHighest: share ?? { min: leastShare } };
  if (rule === 'average') return { band: compression, belowAverage: { max: mostBelow } };
  return { band: compression, difference: { max: mostDifference } };
}

/** Compression of all cylinders; see `measure/compression.ts`, `atmosphere.ts` and `wetTest.ts`. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const air = airOf(inputs);
  if (!air.ok) return air;
  const readings = gaugeReadings(inputs, air.value);
  if (!readings.ok) return readings;
  const rules = rulesOf(inputs);
  const found = judgeCompression(readings.value, rules);
  if (!found.ok)
    return inBoxes(found, {
      readings: 'cylinders',
      'rules.band': 'compression',
      'rules.lowestOfHighest': 'share',
      'rules.belowAverage': 'mostBelow',
      'rules.difference': 'mostDifference',
    });
  const wet = wetFindings(inputs);
  if (!wet.ok) return wet;

  const corrected = air.value !== null;
  const findings = [...judgements(found.value, rules), ...wet.value.findings];
  if (corrected)
    findings.push(noted(said`Readings are corrected to sea level from air of ${show(air.value ?? 0, 'kPa', 0.1)}.`));
  const { compression } = inputs;
  return outcomeOf(
    findings,
    [...resultsOf(found.value, rules, corrected), ...wet.value.results],
    [
      {
        kind: 'bars',
        title: corrected ? 'Compression by cylinder, corrected to sea level' : 'Compression by cylinder',
        unit: 'kPa',
        fineness: FINE,
        items: readings.value.map((_, place) => String(place + 1)),
        series: [{ label: 'Dry', values: readings.value }],
        ...(compression && { band: compression }),
      },
    ],
  );
}

function judgements(found: CompressionFound, rules: CompressionRules): Finding[] {
  const each = found.cylinders.flatMap(({ reading, belowAverage, judged, average }, place) => [
    ...judgedFinding({
      subject: `Cylinder ${place + 1} reads`,
      value: reading,
      judged,
      band: rules.band,
      unit: 'kPa',
      fineness: FINE,
    }),
    ...judgedFinding({
      subject: `Below the average, cylinder ${place + 1} lies by`,
      value: belowAverage,
      judged: average,
      band: rules.belowAverage,
      unit: '%',
      fineness: 1,
    }),
  ]);
  return [
    ...inShort(each, said`Every cylinder passes, from ${kPa(found.lowest)} to ${kPa(found.highest)}.`),
    ...judgedFinding({
      subject: 'The lowest, as a share of the highest, is',
      value: found.lowestOfHighest,
      judged: found.judged.lowestOfHighest,
      band: rules.lowestOfHighest,
      unit: '%',
      fineness: 1,
    }),
    ...judgedFinding({
      subject: 'Between the highest and the lowest there is',
      value: found.difference,
      judged: found.judged.difference,
      band: rules.difference,
      unit: 'kPa',
      fineness: FINE,
    }),
  ];
}

function resultsOf(found: CompressionFound, rules: CompressionRules, corrected: boolean): Result[] {
  const { lowest, highest, lowestOfHighest, judged } = found;
  const at = corrected ? ', at sea level' : '';
  return [
    measured('share', 'Lowest as a share of the highest', lowestOfHighest, '%', 1, {
      verdict: verdictOf(judged.lowestOfHighest),
      formula: said`lowest / highest = ${kPa(lowest)} / ${kPa(highest)} = ${show(lowestOfHighest, '%', 1)}`,
      source: rules.lowestOfHighest && SOURCES.share,
      main: true,
    }),
    measured('mean', `Average of all${at}`, found.mean, 'kPa', FINE, { source: rules.belowAverage && SOURCES.average }),
    measured('difference', `Highest less lowest${at}`, found.difference, 'kPa', FINE, {
      verdict: verdictOf(judged.difference),
      source: rules.difference && SOURCES.difference,
    }),
    ...found.cylinders.map(({ reading, judged: byBand, average }, place) => {
      const verdict = worst([verdictOf(byBand), verdictOf(average)]);
      return measured(`cylinder-${place + 1}`, `Cylinder ${place + 1}${at}`, reading, 'kPa', FINE, {
        ...(verdict !== 'none' && { verdict }),
        ...(corrected && { source: 'Correction to sea level by the standard atmosphere, ISO 2533, quoted.' }),
      });
    }),
  ];
}
