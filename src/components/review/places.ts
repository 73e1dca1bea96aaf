import type { Option } from '@/components/ui/Select';
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
