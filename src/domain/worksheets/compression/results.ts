import type { CompressionFound, CompressionRules } from '../../measure/compression';
import { said } from '../../measure/said';
import type { WetFound } from '../../measure/wetTest';
import type { Chart } from '../charts';
import { measured, verdictOf } from '../findings';
import { worst, type Result, type Verdict } from '../outcome';
import { FINE, kPa, percent, type GaugeReadings, type Inputs } from './readings';

const SOURCES = {
  share: 'Lowest at least 75 % of the highest: TM 5-4210-230-14&P-1, Add. 2.',
  average: '20 % below the average: TM 1-1500-204-23-1 (aircraft).',
  difference: '10 psi between cylinders: TM 10-3930-618-20.',
};
const CORRECTION = 'Correction to sea level by the standard atmosphere, ISO 2533, quoted.';

/** A rule of thumb that is missed is no limit that was missed. */
const softened = (verdict: Verdict | undefined): Verdict | undefined => (verdict === 'fail' ? 'look' : undefined);

export const resultsOf = (
  inputs: Inputs,
  found: CompressionFound,
  wet: WetFound,
  { rules, corrected }: { rules: CompressionRules; corrected: boolean },
): Result[] => [
  ...(found.cylinders.length > 1 ? comparisons(inputs, found, rules, corrected) : []),
  ...found.cylinders.flatMap(({ reading, judged, average }, place) => {
    const name = `Cylinder ${place + 1}`;
    const rise = wet.cylinders[place]?.risePercent ?? null;
    const verdict = worst([verdictOf(judged), softened(verdictOf(average))]);
    return [
      measured(`cylinder-${place + 1}`, `${name}${at(corrected)}`, reading, 'kPa', FINE, {
        ...(verdict !== 'none' && { verdict }),
        ...(corrected && { source: CORRECTION }),
        main: place === found.cylinders.findIndex((one) => one.reading === found.lowest),
      }),
      ...(rise === null ? [] : [measured(`rise-${place + 1}`, `${name}, rise with oil`, rise, '%', 1)]),
    ];
  }),
];

const at = (corrected: boolean) => (corrected ? ', at sea level' : '');

function comparisons(inputs: Inputs, found: CompressionFound, rules: CompressionRules, corrected: boolean): Result[] {
  const { lowest, highest, lowestOfHighest, judged } = found;
  const share = verdictOf(judged.lowestOfHighest);
  return [
    measured('share', 'Lowest against highest', lowestOfHighest, '%', 1, {
      verdict: inputs.share ? share : softened(share),
      formula: said`lowest / highest = ${kPa(lowest)} / ${kPa(highest)} = ${percent(lowestOfHighest)}`,
      ...(!inputs.share && rules.lowestOfHighest && { source: SOURCES.share }),
      main: true,
    }),
    measured('mean', `Average of all${at(corrected)}`, found.mean, 'kPa', FINE, {
      source: rules.belowAverage && SOURCES.average,
    }),
    measured('difference', `Highest less lowest${at(corrected)}`, found.difference, 'kPa', FINE, {
      verdict: softened(verdictOf(judged.difference)),
      source: rules.difference && SOURCES.difference,
    }),
  ];
}

export function compressionChart(
  { compression, nominal }: Inputs,
  { dry, wet }: GaugeReadings,
  corrected: boolean,
): Chart {
  const repeated = wet.some((one) => one !== null);
  return {
    kind: 'bars',
    title: corrected ? 'Compression by cylinder, corrected to sea level' : 'Compression by cylinder',
    unit: 'kPa',
    fineness: FINE,
    items: dry.map((_, place) => String(place + 1)),
    series: [{ label: 'Dry', values: dry }, ...(repeated ? [{ label: 'With oil', values: wet }] : [])],
    ...(compression && { band: compression }),
    ...(nominal !== undefined && { nominal }),
    from: 'least',
  };
}
