import { judgeCompression, type CompressionFound } from '../../measure/compression';
import { said, show } from '../../measure/said';
import type { Worked } from '../../measure/worked';
import { allowed, inBoxes, inShort, judgedFinding, noted, outcomeOf, type Finding } from '../findings';
import type { Outcome } from '../outcome';
import { airOf, FINE, gaugeReadings, kPa, type Inputs } from './readings';
import { compressionChart, resultsOf } from './results';
import { comparison, lowPlaces, rulesOf } from './rules';
import { wetFindings, wetOf } from './wet';

/** Compression of all cylinders; see `measure/compression.ts`, `atmosphere.ts` and `wetTest.ts`. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const air = airOf(inputs);
  if (!air.ok) return air;
  const readings = gaugeReadings(inputs, air.value);
  if (!readings.ok) return readings;
  const rules = rulesOf(inputs);
  const found = judgeCompression(readings.value.dry, rules);
  if (!found.ok)
    return inBoxes(found, {
      readings: 'cylinders',
      'rules.band': 'compression',
      'rules.lowestOfHighest': 'share',
    });
  const low = lowPlaces(found.value, rules);
  const wet = wetOf(inputs, readings.value, low);
  if (!wet.ok) return wet;

  const corrected = air.value !== null;
  const findings = [
    ...pressureFindings(inputs, found.value),
    ...comparison(inputs, found.value),
    ...wetFindings(wet.value, readings.value, low),
  ];
  if (findings.length === 0)
    findings.push(noted(said`The cylinder reads ${kPa(found.value.lowest)}; no limit was given.`));
  if (air.value !== null)
    findings.push(noted(said`Readings are corrected to sea level from air of ${show(air.value, 'kPa', 0.1)}.`));
  return outcomeOf(findings, resultsOf(inputs, found.value, wet.value, { rules, corrected }), [
    compressionChart(inputs, readings.value, corrected),
  ]);
}

function pressureFindings({ compression: band }: Inputs, { cylinders, lowest }: CompressionFound): Finding[] {
  if (!band) return [];
  const each = cylinders.flatMap(({ reading, judged }, place) =>
    judgedFinding({
      subject: `Cylinder ${place + 1} reads`,
      value: reading,
      judged,
      band,
      unit: 'kPa',
      fineness: FINE,
    }),
  );
  return inShort(each, said`The lowest reads ${kPa(lowest)}; ${allowed(band, 'kPa', FINE)}.`);
}
