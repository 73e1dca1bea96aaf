import type { ClampCheck } from '../../measure/clampLoad';
import { formatNumber, type BothUnits } from '../../measure/format';
import { said, show } from '../../measure/said';
import type { Result, Verdict } from '../outcome';
import { showTorque } from '../showTorque';

const FORMULA = "T = K · d · F: Shigley's Mechanical Engineering Design, equation 8-27.";

const SQUARE_INCH = 0.0254 ** 2;
const area = (m2: number): BothUnits => ({
  metric: `${formatNumber(Number((m2 * 1e6).toPrecision(3)))} mm²`,
  inch: `${formatNumber(Number((m2 / SQUARE_INCH).toPrecision(3)))} in²`,
});
const force = (newtons: number) => show(newtons, 'kN', newtons < 10_000 ? 0.01 : 0.1);

/** The numbers of a clamp check; those that cannot be given are left out. */
export function resultsOf(torque: number, check: ClampCheck, verdict: Verdict): Result[] {
  const { thread, nutFactor, clampLoad, proof, share } = check;
  if (thread.kind === 'pipe' || nutFactor === null || clampLoad === null) return [];
  const k = nutFactor.k.toFixed(2);
  const diameter = show(thread.diameter, thread.kind === 'metric' ? 'mm' : 'in');
  const results: Result[] = [];
  if (proof !== null && share !== null) {
    const percent = `${formatNumber(share * 100, share < 0.1 ? 1 : 0)} %`;
    results.push({
      key: 'share',
      label: check.about === 'snug torque' ? 'Share of proof, before the angle' : 'Share of proof',
      value: share * 100,
      unit: '%',
      text: { metric: percent, inch: percent },
      ...(verdict !== 'none' && { verdict }),
      formula: said`F / Fp = ${force(clampLoad)} / ${force(proof.load)} = ${percent}`,
      main: true,
    });
  }
  results.push({
    key: 'clamp-load',
    label: check.about === 'snug torque' ? 'Clamp load, before the angle' : 'Clamp load',
    value: clampLoad / 1000,
    unit: 'kN',
    text: force(clampLoad),
    formula: said`F = T / (K · d) = ${showTorque(torque)} / (${k} · ${diameter}) = ${force(clampLoad)}`,
    source: FORMULA,
    main: true,
  });
  results.push({
    key: 'nut-factor',
    label: 'Nut factor K',
    value: nutFactor.k,
    unit: null,
    text: { metric: k, inch: k },
    source: `K: ${nutFactor.origin}.`,
  });
  if (proof === null) return results;
  return [
    ...results,
    {
      key: 'proof-load',
      label: `Proof load of ${thread.name}, ${proof.standard}`,
      value: proof.load / 1000,
      unit: 'kN',
      text: force(proof.load),
      formula: said`Fp = Sp · As = ${show(proof.stress, 'MPa', 1)} · ${area(proof.area)} = ${force(proof.load)}`,
      source: `Proof stress: ${proof.standard}, as quoted in secondary tables.`,
    },
    {
      key: 'stress-area',
      label: 'Stress area',
      value: null,
      unit: null,
      text: area(proof.area),
      formula: thread.kind === 'metric' ? said`As = π/4 · (d − 0.9382 · P)²` : said`As = π/4 · (D − 0.9743 / n)²`,
      source:
        thread.kind === 'metric'
          ? 'Stress area: ISO 898-1, quoted.'
          : 'Stress area: ASME B1.1, from memory; agrees with quoted tables.',
    },
  ];
}
