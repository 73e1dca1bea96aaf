import { formatNumber } from '../../measure/format';
import { roundTo } from '../../measure/round';
import { said, show } from '../../measure/said';
import { type Worked, refused, worked } from '../../measure/worked';
import { torqueAtBolt, wrenchSetting } from '../../measure/wrenchAdapter';
import type { Values } from '../fields';
import type { Outcome, Result } from '../outcome';
import { showTorque } from '../showTorque';
import type { fields } from './schema';

const SOURCE =
  'US Army TM 1-1500-204-23-9, 8-5 (straight, pointing back, at a right angle) and TM 9-254, figure 4-6 (any angle); FAA AC 43.13-1B, 7-40h.';

/** A step that misses by more than a good wrench may be off by itself: ±4 %, ISO 6789, quoted. */
const STEP_ALLOWED = 0.04;

/** What to set a torque wrench to when an adapter changes how far the bolt stands from the hand. */
export function compute({ atBolt, step, length, adapter, angle = 0 }: Values<typeof fields>): Worked<Outcome> {
  const wrench = { length, adapter, angle };
  const setting = wrenchSetting(atBolt, wrench);
  if (!setting.ok) return setting;
  const unadjusted = torqueAtBolt(atBolt, wrench);
  if (!unadjusted.ok) return unadjusted;

  const set = step === undefined ? setting.value : roundTo(setting.value, step);
  if (set === 0)
    return refused({
      field: 'step',
      message: 'The setting is less than half a step of the wrench. Take a smaller wrench.',
    });
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
      text: showTorque(set),
      formula: said`Tw = Ta · L / (L + E · cos θ) = ${showTorque(atBolt)} · ${long} / (${long} + ${short} · cos ${turned}) = ${showTorque(setting.value)}`,
      source: SOURCE,
      main: true,
    },
    { key: 'at-bolt', label: 'The bolt then gets', value: reached.value, unit: 'N·m', text: showTorque(reached.value) },
    {
      key: 'unadjusted',
      label: 'Without allowing for the adapter, the bolt would get',
      value: unadjusted.value,
      unit: 'N·m',
      text: showTorque(unadjusted.value),
    },
  ];
  const share = unadjusted.value / atBolt - 1;
  const wrong = `${formatNumber(Math.abs(share) * 100, 0)} % too ${share > 0 ? 'much' : 'little'}`;
  const reasons = [
    said`Set the wrench to ${showTorque(set)}, and the bolt gets ${showTorque(reached.value)}.`,
    Math.abs(share) < 0.005
      ? said`The adapter changes nothing, because it does not make the wrench longer or shorter.`
      : said`Set to ${showTorque(atBolt)} as if there were no adapter, the bolt would get ${showTorque(unadjusted.value)}, ${wrong}.`,
  ];
  const off = Math.abs(reached.value / atBolt - 1);
  if (off <= STEP_ALLOWED) return worked({ verdict: 'none', reasons, results, charts: [] });
  const coarse = said`The steps of this wrench miss the torque by ${formatNumber(off * 100, 0)} %. Take one that can be set finer.`;
  return worked({ verdict: 'look', reasons: [coarse, ...reasons], results, charts: [] });
}
