import { listed, nameInside } from '../wording';
import { inBothUnits, withUnit, type BothUnits } from '../measure/format';
import { isUnit } from '../measure/convert';
import { STAGES, type Stage } from './components';
import type { Limit, Part, Supply, Timer, Torque } from './schema';

/** Display texts of the values of a sheet, as a reader in metric and a reader in inch units see them. */

const same = (text: string): BothUnits => ({ metric: text, inch: text });
const both = (make: (system: 'metric' | 'inch') => string): BothUnits => ({
  metric: make('metric'),
  inch: make('inch'),
});

/**
 * "10 ±1 N·m" and "89 ±9 lbf·in"; with turns "20 N·m, then 90° and 90°, each ±5°". With `pass` (from 1) the
 * torque of that pass alone. The final torque where the pass does not exist.
 */
export function torqueText(torque: Torque, { pass }: { pass?: number | undefined } = {}): BothUnits {
  const passNm = pass === undefined ? undefined : torque.passes?.[pass - 1];
  if (passNm !== undefined) {
    const shown = inBothUnits([passNm], 'N·m');
    return both((system) => withUnit(shown[system].numbers[0] ?? '', shown[system].unit));
  }
  const shown = inBothUnits(torque.tolerance === undefined ? [torque.nm] : [torque.nm, torque.tolerance], 'N·m');
  const angles = torque.angles ?? [];
  const each =
    torque.angleTolerance === undefined ? '' : `${angles.length > 1 ? ', each' : ''} ±${torque.angleTolerance}°`;
  const turns = angles.length ? `, then ${listed(angles.map((a) => `${a}°`))}${each}` : '';
  return both((system) => {
    const { numbers, unit } = shown[system];
    const [nm = '', tolerance] = numbers;
    return `${withUnit(tolerance === undefined ? nm : `${nm} ±${tolerance}`, unit)}${turns}`;
  });
}

/** "0.02 to 0.06 mm", "0.05 mm or less", "2.5 (2.4 to 2.6) mm"; the finding for a limit without numbers. */
export function limitText(limit: Limit): BothUnits {
  const { unit, min, max, nominal, resolution } = limit;
  if (unit === undefined || !isUnit(unit)) return same(limit.expect ?? '');
  const values = [min, max, nominal].filter((v): v is number => v !== undefined);
  const shown = inBothUnits(values, unit, resolution, true);
  return both((system) => {
    const { numbers, unit: shownUnit } = shown[system];
    const at = (value: number | undefined) => (value === undefined ? undefined : numbers[values.indexOf(value)]);
    const [low, high, middle] = [at(min), at(max), at(nominal)];
    const range =
      low !== undefined && high !== undefined
        ? low === high
          ? low
          : `${low} to ${high}`
        : low !== undefined
          ? `${low} or more`
          : high !== undefined
            ? `${high} or less`
            : undefined;
    if (middle === undefined) {
      // "0.05 mm or less": the unit stands at the number, not behind the words.
      const [number = '', words] = (range ?? '').split(/ (?=or )/);
      return words ? `${withUnit(number, shownUnit)} ${words}` : withUnit(number, shownUnit);
    }
    return range === undefined ? withUnit(middle, shownUnit) : withUnit(`${middle} (${range})`, shownUnit);
  });
}

/** "30 s", "10 min", "1 h 30 min", "24 h", "7 days". Minutes in; days only where they come out even, from three on. */
export function durationText(minutes: number): string {
  const seconds = Math.round(minutes * 60);
  if (seconds < 60) return `${seconds} s`;
  const days = seconds / 86_400;
  if (days >= 3 && Number.isInteger(days)) return `${days} days`;
  const parts = [
    [Math.floor(seconds / 3600), 'h'],
    [Math.floor((seconds % 3600) / 60), 'min'],
    [seconds % 60, 's'],
  ] as const;
  return parts
    .filter(([n]) => n > 0)
    .map(([n, unit]) => `${n} ${unit}`)
    .join(' ');
}

export const timerText = (timer: Timer): BothUnits => same(durationText(timer.minutes));

/** Time of a supply's stage; empty where the supply has none. */
export function stageText(supply: Supply, stage: Stage): BothUnits {
  const minutes = supply[STAGES[stage]];
  return same(minutes === undefined ? '' : durationText(minutes));
}

const CONDITION_WORDS: Record<Torque['condition'], string> = {
  dry: 'dry',
  oiled: 'oiled',
  threadlocker: 'with threadlocker',
  sealant: 'with sealant',
  'anti-seize': 'with anti-seize',
};

/** What a torque stands on: "M6×1.0×25, class 8.8, dry". */
export function threadText(torque: Torque): string {
  const pitch =
    torque.pitch === undefined ? '' : `×${Number.isInteger(torque.pitch) ? torque.pitch.toFixed(1) : torque.pitch}`;
  const length = torque.length === undefined ? '' : `×${torque.length}`;
  const grade =
    torque.class === undefined
      ? []
      : [/^SAE\b/i.test(torque.class) ? torque.class.replace(/^SAE\s*/i, 'SAE grade ') : `class ${torque.class}`];
  return [`${torque.thread}${pitch}${length}`, ...grade, CONDITION_WORDS[torque.condition]].join(', ');
}

const headNoun = (name: string) => name.split(',')[0]?.trim() ?? name;

/**
 * A part's name as it stands in a sentence: "cover gasket" for "Cover gasket, moulded". What follows the comma
 * is kept where another part would otherwise be called the same.
 */
export function partText(part: Part, parts: readonly Part[], startsSentence: boolean): string {
  const noun = headNoun(part.name);
  const isPlain = parts.filter((p) => headNoun(p.name).toLowerCase() === noun.toLowerCase()).length === 1;
  const name = isPlain ? noun : part.name;
  return startsSentence ? name : nameInside(name);
}
