import type { Frontmatter } from './schema';
import { suggestion } from './nearest';
import { bindingFault, bindingsIn } from './bindings';
import { READINGS, WORKSHEET_KINDS } from './worksheets';

/** Attributes of a component as written: literal text only. */
export type Attributes = Readonly<Record<string, string>>;

export interface AttributeFault {
  attribute: string;
  message: string;
}

/** One component of the closed set: where it stands, what it may carry, what it points at. */
export interface Component {
  /** `sentence`: among words. `block`: on its own, directly in a step. `step`: at the top level. */
  stands: 'sentence' | 'block' | 'step';
  holds: 'nothing' | 'words' | 'blocks';
  /** In the order in which they are written. */
  attributes: Readonly<Record<string, 'required' | 'optional'>>;
  example: string;
  /** Whether what it points at exists; runs only on a valid front matter. */
  faults: (given: Attributes, head: Frontmatter) => AttributeFault[];
}

const keysOf = (entries: readonly { key: string }[]) => entries.map((e) => e.key);

function missing(
  entries: readonly { key: string }[],
  key: string | undefined,
  list: string,
  attribute = 'of',
): AttributeFault[] {
  if (key === undefined || entries.some((e) => e.key === key)) return [];
  return [{ attribute, message: `"${key}" is not among the ${list}. ${suggestion(key, keysOf(entries))}` }];
}

function torqueFaults(given: Attributes, head: Frontmatter): AttributeFault[] {
  const torque = head.torques.find((t) => t.key === given['of']);
  const pass = given['pass'];
  if (!torque || pass === undefined) return missing(head.torques, given['of'], 'torques');
  const passes = torque.passes?.length ?? 0;
  if (/^[1-9]\d?$/.test(pass) && Number(pass) <= passes) return [];
  const there =
    passes === 0
      ? 'has no passes; leave pass out for the final torque'
      : `has ${passes === 1 ? 'one pass' : `passes 1 to ${passes}`} before the final torque`;
  return [{ attribute: 'pass', message: `Pass "${pass}" does not exist: ${torque.name} ${there}.` }];
}

export const STAGES = { 'skin-over': 'skinOver', cure: 'cure' } as const;
export type Stage = keyof typeof STAGES;
export const isStage = (text: string | undefined): text is Stage => text !== undefined && Object.hasOwn(STAGES, text);

function timerFaults(given: Attributes, head: Frontmatter): AttributeFault[] {
  const { of, stage } = given;
  const supply = head.supplies.find((s) => s.key === of);
  if (stage === undefined) {
    if (supply && !head.timers.some((t) => t.key === of))
      return [
        { attribute: 'of', message: `"${of}" is a supply: say which of its times, stage="skin-over" or stage="cure".` },
      ];
    return missing(head.timers, of, 'timers');
  }
  if (!isStage(stage))
    return [{ attribute: 'stage', message: `Stage "${stage}" does not exist. Write skin-over or cure.` }];
  if (!supply) return missing(head.supplies, of, 'supplies');
  if (supply[STAGES[stage]] !== undefined) return [];
  return [{ attribute: 'stage', message: `${supply.name} has no ${stage} time. Write it in the supplies first.` }];
}

function worksheetFaults(given: Attributes, head: Frontmatter): AttributeFault[] {
  const kind = given['kind'] ?? '';
  const bindings = bindingsIn(given['of']);
  const keys = bindings.map(({ key }) => key);
  if (!WORKSHEET_KINDS.includes(kind))
    return [{ attribute: 'kind', message: `There is no worksheet "${kind}". ${suggestion(kind, WORKSHEET_KINDS)}` }];
  if (kind === READINGS && keys.length === 0)
    return [
      {
        attribute: 'of',
        message: 'A worksheet of readings names the limits to read, for example of="end-float preload".',
      },
    ];
  // One limit may judge several fields, each of them once.
  const tokens = bindings.map(({ field, key }) => `${field ?? ''}:${key}`);
  const twice = keys.find((_, i) => tokens.indexOf(tokens[i] ?? '') !== i);
  if (twice) return [{ attribute: 'of', message: `"${twice}" is named twice in this worksheet.` }];
  return bindings.flatMap((binding) => {
    const wrong = bindingFault(
      kind,
      binding,
      head.limits.find(({ key }) => key === binding.key),
    );
    return [
      ...(wrong === null ? [] : [{ attribute: 'of', message: wrong }]),
      ...missing(head.limits, binding.key, 'limits'),
    ];
  });
}

/** A component that names one entry of one list and nothing else. */
const pointer = (
  stands: Component['stands'],
  list: 'cautions' | 'limits' | 'parts' | 'figures',
  example: string,
): Component => ({
  stands,
  holds: 'nothing',
  attributes: { of: 'required' },
  example,
  faults: (given, head) => missing(head[list], given['of'], list),
});

export const COMPONENTS: Readonly<Record<string, Component>> = {
  Step: {
    stands: 'step',
    holds: 'blocks',
    attributes: { id: 'required', title: 'required' },
    example: '<Step id="draw-down" title="Draw the cover down">',
    faults: () => [],
  },
  Caution: pointer('block', 'cautions', '<Caution of="hot-oil" />'),
  Torque: {
    stands: 'sentence',
    holds: 'nothing',
    attributes: { of: 'required', pass: 'optional' },
    example: '<Torque of="cover-bolt" />',
    faults: torqueFaults,
  },
  Limit: pointer('sentence', 'limits', '<Limit of="oil-level" />'),
  Part: pointer('sentence', 'parts', '<Part of="cover-gasket" />'),
  Timer: {
    stands: 'sentence',
    holds: 'nothing',
    attributes: { of: 'required', stage: 'optional' },
    example: '<Timer of="soak" />',
    faults: timerFaults,
  },
  Figure: pointer('block', 'figures', '<Figure of="underside" />'),
  Worksheet: {
    stands: 'block',
    holds: 'nothing',
    attributes: { kind: 'required', of: 'optional' },
    example: '<Worksheet kind="readings" of="end-float" />',
    faults: worksheetFaults,
  },
  Hold: {
    stands: 'block',
    holds: 'words',
    attributes: {},
    example: '<Hold>A senior technician checks the last pass.</Hold>',
    faults: () => [],
  },
};

export const componentOf = (name: string | null): Component | undefined =>
  name !== null && Object.hasOwn(COMPONENTS, name) ? COMPONENTS[name] : undefined;
