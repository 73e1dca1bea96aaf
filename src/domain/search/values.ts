import { nameInside } from '../wording';
import { convert, quantityOf, type Unit, type UnitQuantity } from '../measure/convert';
import { formatMeasure, inBothUnits, withUnit } from '../measure/format';
import type { SearchDocument, SearchLimit, SearchTorque } from './documents';
import { agreement, type ReadMeasure, type ReadQuantity } from './quantities';

/** Every number of the book's sheets, ordered by size, so that a measure finds its sheets without reading them all. */

export type UnitSystem = 'metric' | 'inch';

interface Entry {
  /** Place of the document in the list the index was made from. */
  document: number;
  kind: 'torque' | 'limit' | 'timer';
  /** Place in the document's own list of that kind. */
  at: number;
  value: number;
  unit: Unit;
  /** Final values count for more than a pass on the way there. */
  weight: number;
}

/** A value of a sheet that answers the query, best of its document. */
export interface ValueMatch {
  kind: Entry['kind'];
  at: number;
  /** The number that agreed, in `unit`; null where only the thread was asked for. */
  value: number | null;
  unit: Unit;
  /** 0 to 1 a quantity asked for, summed. */
  score: number;
  /** How many of the quantities asked for it answers. */
  answers: number;
}

/** The unit that values of one quantity are compared in. Mass flow has its own: it cannot become volume flow. */
const BASE: Partial<Record<UnitQuantity, Unit>> = {
  length: 'mm',
  torque: 'N·m',
  force: 'N',
  pressure: 'kPa',
  temperature: '°C',
  volume: 'mL',
  time: 'min',
  voltage: 'V',
  resistance: 'Ω',
  mass: 'g',
};

function inBase(value: number, unit: Unit): { key: string; value: number } | null {
  const quantity = quantityOf(unit);
  const base = quantity === 'flow' ? (unit === 'lb/h' || unit === 'g/s' ? 'g/s' : 'cc/min') : (BASE[quantity] ?? unit);
  const converted = convert(value, unit, base);
  return converted.ok ? { key: base, value: converted.value } : null;
}

const THREAD_END = /^(?:×|$)/;
/** "M6" asks for any pitch, "M6×1.0" for that one. */
const sameThread = (asked: string, thread: string): boolean =>
  thread.toLowerCase().startsWith(asked.toLowerCase()) && THREAD_END.test(thread.slice(asked.length));

function entriesOf(document: SearchDocument, at: number): Entry[] {
  const entry = (kind: Entry['kind'], i: number, value: number, unit: Unit, weight: number): Entry => ({
    document: at,
    kind,
    at: i,
    value,
    unit,
    weight,
  });
  return [
    ...document.torques.flatMap((torque, i) => [
      entry('torque', i, torque.nm, 'N·m', 1),
      ...torque.passes.map((pass) => entry('torque', i, pass, 'N·m', 0.6)),
      ...torque.angles.map((angle) => entry('torque', i, angle, '°', 1)),
    ]),
    ...document.limits.flatMap((limit, i) =>
      [limit.min, limit.nominal, limit.max].flatMap((value) =>
        value === null || limit.unit === null ? [] : [entry('limit', i, value, limit.unit as Unit, 0.9)],
      ),
    ),
    ...document.timers.map((timer, i) => entry('timer', i, timer.minutes, 'min', 0.7)),
  ];
}

export class ValueIndex {
  readonly #byUnit = new Map<string, { value: number; entry: Entry }[]>();
  readonly #byThread = new Map<string, { document: number; at: number }[]>();

  constructor(documents: readonly SearchDocument[]) {
    documents.forEach((document, at) => {
      document.torques.forEach(({ thread }, i) => {
        const torques = this.#byThread.get(thread) ?? [];
        torques.push({ document: at, at: i });
        this.#byThread.set(thread, torques);
      });
      for (const entry of entriesOf(document, at)) {
        const based = inBase(entry.value, entry.unit);
        if (!based) continue;
        const row = this.#byUnit.get(based.key) ?? [];
        row.push({ value: based.value, entry });
        this.#byUnit.set(based.key, row);
      }
    });
    for (const row of this.#byUnit.values()) row.sort((a, b) => a.value - b.value);
  }

  /**
   * The values that answer at least one of the quantities, by document. One value that answers two ("10 N·m", "M6") beats two
   * values that answer one each.
   */
  find(quantities: readonly ReadQuantity[]): Map<number, ValueMatch[]> {
    const found = new Map<number, ValueMatch[]>();
    const add = (document: number, match: ValueMatch): void => {
      const of = found.get(document);
      const at = of?.findIndex((one) => one.kind === match.kind && one.at === match.at) ?? -1;
      const known = of?.[at];
      if (!of) found.set(document, [match]);
      else if (!known) of.push(match);
      else if (match.value !== null && known.value !== null) {
        if (match.score > known.score) of[at] = match;
      } else
        of[at] = {
          ...known,
          value: known.value ?? match.value,
          unit: known.value === null ? match.unit : known.unit,
          score: known.score + match.score,
          answers: known.answers + match.answers,
        };
    };
    for (const quantity of quantities) {
      if (quantity.kind === 'thread') this.#threads(quantity.thread, add);
      else this.#measures(quantity, add);
    }
    return found;
  }

  #threads(asked: string, add: (document: number, match: ValueMatch) => void): void {
    for (const [thread, torques] of this.#byThread)
      if (sameThread(asked, thread))
        for (const { document, at } of torques)
          add(document, { kind: 'torque', at, value: null, unit: 'N·m', score: 0.7, answers: 1 });
  }

  #measures(read: ReadMeasure, add: (document: number, match: ValueMatch) => void): void {
    const least = inBase(read.low - read.halfDigit, read.unit);
    const most = inBase(read.high + read.halfDigit, read.unit);
    if (!most) return;
    const row = this.#byUnit.get(most.key) ?? [];
    // A little wider than any agreement can reach; `agreement` decides.
    const reach = 0.05 * Math.abs(most.value);
    const from = (least?.value ?? 0) - reach;
    let low = 0;
    let high = row.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((row[middle]?.value ?? 0) < from) low = middle + 1;
      else high = middle;
    }
    for (let i = low; i < row.length; i += 1) {
      const candidate = row[i];
      if (!candidate || candidate.value > most.value + reach) break;
      const { entry } = candidate;
      const score = entry.weight * agreement(read, entry.value, entry.unit);
      if (score > 0)
        add(entry.document, {
          kind: entry.kind,
          at: entry.at,
          value: entry.value,
          unit: entry.unit,
          score,
          answers: 1,
        });
    }
  }
}

/** What the value is called on its sheet: "Cover bolt". */
export function nameOf(document: SearchDocument, match: ValueMatch): string {
  const list = { torque: document.torques, limit: document.limits, timer: document.timers }[match.kind];
  return list[match.at]?.name ?? '';
}

const atStep = (step: number | null): string => (step === null ? '' : `, step ${step}`);
function sayTorque(torque: SearchTorque, match: ValueMatch, units: UnitSystem): { value: string; rest: string } {
  const shown = match.value ?? torque.nm;
  const value = match.unit === '°' ? `${shown}°` : formatMeasure(shown, 'N·m')[units];
  const pass = torque.passes.indexOf(shown);
  const way = match.unit === '°' ? 'turn of ' : pass >= 0 && shown !== torque.nm ? `pass ${pass + 1} of ` : '';
  const places = torque.count === 1 ? '1 place' : `${torque.count} places`;
  return { value, rest: `${way}${nameInside(torque.name)}, ${torque.thread}, ${places}${atStep(torque.step)}` };
}

function sayLimit(limit: SearchLimit, value: number | null, units: UnitSystem): { value: string; rest: string } {
  const { min, nominal, max, resolution } = limit;
  const unit = limit.unit as Unit;
  const say = (...ends: number[]): string => {
    const texts = inBothUnits(ends, unit, resolution ?? undefined, true)[units];
    return withUnit(texts.numbers.join(' to '), texts.unit);
  };
  const span = min !== null && max !== null ? say(min, max) : '';
  const rest = nameInside(limit.name);
  if (nominal !== null && (value === nominal || !span))
    return { value: say(nominal), rest: span ? `${rest}, ${span}` : rest };
  if (span) return { value: span, rest };
  return min !== null ? { value: `at least ${say(min)}`, rest } : { value: `at most ${say(max ?? 0)}`, rest };
}

/** A match in words: the value for the eye, then what it is for. */
export function sayValue(
  document: SearchDocument,
  match: ValueMatch,
  units: UnitSystem,
): { value: string; rest: string; step: number | null } {
  if (match.kind === 'torque') {
    const torque = document.torques[match.at];
    if (torque) return { ...sayTorque(torque, match, units), step: torque.step };
  }
  if (match.kind === 'limit') {
    const limit = document.limits[match.at];
    if (limit) {
      const { value, rest } = sayLimit(limit, match.value, units);
      return { value, rest: rest + atStep(limit.step), step: limit.step };
    }
  }
  const timer = document.timers[match.at];
  const minutes = timer?.minutes ?? 0;
  const value = minutes >= 60 && minutes % 60 === 0 ? `${minutes / 60} h` : `${minutes} min`;
  return { value, rest: nameInside(timer?.name ?? '') + atStep(timer?.step ?? null), step: timer?.step ?? null };
}
