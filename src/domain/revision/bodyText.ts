import { bindingsIn } from '../procedure/bindings';
import { isStage } from '../procedure/components';
import { worksheetNamed } from '../worksheets/registry';
import type { Frontmatter } from '../procedure/schema';
import { limitText, partText, stageText, timerText, torqueText } from '../procedure/values';
import { worksheetTitle } from '../procedure/worksheets';
import { type Found, replaceComponents } from './components';

const PASS_WORDS = ['first pass', 'second pass', 'third pass', 'fourth pass', 'fifth pass', 'sixth pass'];
export const passWords = (pass: number): string => PASS_WORDS[pass - 1] ?? `pass ${pass}`;

function textOf({ name, given, inside }: Found, head: Frontmatter): string | null {
  const of = <T extends { key: string }>(list: readonly T[]) => list.find(({ key }) => key === given['of']);
  switch (name) {
    case 'Torque': {
      const torque = of(head.torques);
      if (!torque) return null;
      const pass = given['pass'] === undefined ? undefined : Number(given['pass']);
      const which = pass === undefined ? torque.name : `${torque.name}, ${passWords(pass)}`;
      return `${torqueText(torque, { pass }).metric} (${which})`;
    }
    case 'Limit': {
      const limit = of(head.limits);
      return limit ? `${limitText(limit).metric} (${limit.name})` : null;
    }
    case 'Part': {
      const part = of(head.parts);
      return part ? partText(part, head.parts, false) : null;
    }
    case 'Timer': {
      const { stage } = given;
      const supply = of(head.supplies);
      if (isStage(stage)) return supply ? `${stageText(supply, stage).metric} (${supply.name})` : null;
      const timer = of(head.timers);
      return timer ? `${timerText(timer).metric} (${timer.name})` : null;
    }
    case 'Figure': {
      const figure = of(head.figures);
      return figure ? `Figure: ${figure.caption}` : null;
    }
    case 'Worksheet': {
      const fields = worksheetNamed(given['kind'])?.fields ?? {};
      const names = bindingsIn(given['of']).map(({ field, key }) => {
        const name = head.limits.find((l) => l.key === key)?.name ?? key;
        return field === null ? name : `${fields[field]?.label ?? field} by ${name}`;
      });
      const title = worksheetTitle(given['kind']) ?? given['kind'] ?? '';
      return `Worksheet: ${[title, ...names].join('; ')}`;
    }
    case 'Hold':
      return `Hold point. ${bodyText(inside, head)}`;
    default:
      return null;
  }
}

/**
 * A body or introduction as a reviewer reads it: each component replaced by the value that it stands for,
 * "5 N·m (Cover bolt, first pass)". The name stands behind the value, so that pointing at another bolt with the same
 * torque shows as a change. More than one blank line, and blanks at the end of a line, are no difference.
 */
export function bodyText(body: string, head: Frontmatter): string {
  return replaceComponents(body, (found) => textOf(found, head))
    .replace(/[^\S\n]+$/gm, '')
    .replace(/\n{3,}/g, '\n\n')
    .trim();
}

/** What a step makes somebody work to, in reading order: "torque cover-bolt 1", "limit weep"; and its hold points. */
export function actedOn(body: string): {
  values: { kind: 'torque' | 'limit'; key: string; id: string }[];
  holds: string[];
} {
  const values: { kind: 'torque' | 'limit'; key: string; id: string }[] = [];
  const holds: string[] = [];
  replaceComponents(body, ({ name, given, inside }) => {
    const key = given['of'] ?? '';
    if (name === 'Torque') values.push({ kind: 'torque', key, id: `torque ${key} ${given['pass'] ?? ''}` });
    if (name === 'Limit') values.push({ kind: 'limit', key, id: `limit ${key}` });
    // A worksheet judges readings against its limits, so to leave one out is to stop measuring it.
    if (name === 'Worksheet')
      for (const { field, key: limit } of bindingsIn(given['of']))
        values.push({ kind: 'limit', key: limit, id: `worksheet ${given['kind'] ?? ''} ${field ?? ''} ${limit}` });
    if (name === 'Hold') holds.push(inside.trim());
    return null;
  });
  return { values, holds };
}
