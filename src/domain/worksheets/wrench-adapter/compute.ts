import { formatNumber } from '../../measure/format';
import { roundTo } from '../../measure/round';
import { said, show } from '../../measure/said';
import { type Worked, worked } from '../../measure/worked';
import { torqueAtBolt, wrenchSetting } from '../../measure/wrenchAdapter';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import { torqueStep } from '../torqueStep';
import type { fields } from './schema';

const SOURCE =
  'US Army TM 1-1500-204-23-9, 8-5 (straight, pointing back, at a right angle) and TM 9-254, figure 4-6 (any angle); FAA AC 43.13-1B, 7-40h.';

const nm = (torque: number, step = torqueStep(torque)) => show(torque, 'N·m', step);

/** What to set a torque wrench to when an adapter changes how far the bolt stands from the hand. */
export function compute({ atBolt, step, ...wrench }: Values<typeof fields>): Worked<Outcome> {
  const setting = wrenchSetting(atBolt, wrench);
  if (!setting.ok) return setting;
  const unadjusted = torqueAtBolt(atBolt, wrench);
  if (!unadjusted.ok) return unadjusted;

  // Under half a step there is nothing to set; the number as it is then says that the wrench is too large.
  const set = step === undefined ? setting.value : roundTo(setting.value, step) || setting.value;
  const reached = torqueAtBolt(set, wrench);
  if (!reached.ok) return reached;
  const [long, short] = [show(wrench.length, 'mm', 1), show(wrench.adapter, 'mm', 1)];
  const turned = `${formatNumber(wrench.angle)}°`;
  const results: Result[] = [
    {
      key: 'setting',
      label: 'Set the wrench to',
      value: set,
      unit: 'N·m',
      text: nm(set, step),
      formula: said`T_w = T_a · L / (L + E · cos θ) = ${nm(atBolt)} · ${long} / (${long} + ${short} · cos ${turned}) = ${nm(setting.value)}`,
      source: SOURCE,
      main: true,
    },
    { key: 'at-bolt', label: 'The bolt then gets', value: reached.value, unit: 'N·m', text: nm(reached.value) },
    {
      key: 'unadjusted',
      label: `Left at the sheet's torque, the wrench would give the bolt`,
      value: unadjusted.value,
      unit: 'N·m',
      text: nm(unadjusted.value),
    },
  ];
  const share = unadjusted.value / atBolt - 1;
  const wrong = `${formatNumber(Math.abs(share) * 100, 0)} % too ${share > 0 ? 'much' : 'little'}`;
  const reasons = [
    said`Set the wrench to ${nm(set, step)}, and the bolt gets ${nm(reached.value)}.`,
    Math.abs(share) < 0.005
      ? said`The adapter changes nothing, because it does not make the wrench longer or shorter.`
      : said`Set to ${nm(atBolt)} as if there were no adapter, the bolt would get ${nm(unadjusted.value)}, ${wrong}.`,
  ];
  return worked({ verdict: 'none', reasons, results, charts: [] });
}
