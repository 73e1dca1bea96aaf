import type { Option } from '@/components/ui/Select';
import type { Remark } from '@/domain/api/schemas/proposals';
import type { StepPair } from '@/domain/revision/twoTexts';
import type { ValueRow } from '@/domain/revision/valueRows';

/** Everything a reason can be tied to: the whole, a value that changes, a step. */
export const placesOf = (pairs: readonly StepPair[], values: readonly ValueRow[]): Option[] => [
  { value: '', label: 'The whole proposal' },
  ...values.map(({ path, label }) => ({ value: path, label: `Value: ${label}` })),
  ...pairs.map(({ id, old, now }) => {
    const side = now ?? old;
    const title = side?.title.map(({ text }) => text).join('') ?? id;
    const number = side?.number;
    return {
      value: `step:${id}`,
      label: number ? `Step ${number}${now ? '' : ' (removed)'}: ${title}` : title,
    };
  }),
];

/** What of a comparison stands on the page: its steps by id, and its changed values by path in the order they stand in. */
export interface Shown {
  steps: ReadonlySet<string>;
  paths: readonly string[];
}

/**
 * Where a remark with that anchor stands: `step:<id>`, or the path of the first changed value that belongs to it. Null
 * where it is on the whole, and where what it was tied to is no longer there.
 */
export function standsAt(anchor: string | null, { steps, paths }: Shown): string | null {
  if (anchor === null) return null;
  if (anchor.startsWith('step:')) return steps.has(anchor.slice(5)) ? anchor : null;
  return paths.find((path) => path === anchor || path.startsWith(`${anchor}.`)) ?? null;
}

/** The remarks that stand nowhere else on the page, each with what became of its place; undefined for the whole. */
export const unplaced = (remarks: readonly Remark[], shown: Shown): { remark: Remark; about: string | undefined }[] =>
  remarks
    .filter(({ anchor }) => standsAt(anchor, shown) === null)
    .map((remark) => ({
      remark,
      about:
        remark.anchor === null
          ? undefined
          : remark.anchor.startsWith('step:')
            ? 'about a step that is no longer there'
            : 'about a value that no longer changes',
    }));
