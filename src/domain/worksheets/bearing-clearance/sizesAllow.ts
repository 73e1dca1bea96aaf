import { clearanceStack } from '../../measure/clearanceStack';
import { worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { measured } from '../findings';
import type { Result } from '../outcome';
import { FINE } from './bearing';
import type { fields } from './schema';

/** The clearances that the allowed sizes can meet in, where both sizes have both ends. */
export function sizesAllow({ bore, journal }: Pick<Values<typeof fields>, 'bore' | 'journal'>): Worked<Result[]> {
  if (bore?.min === undefined || bore.max === undefined || journal?.min === undefined || journal.max === undefined)
    return worked([]);
  const stack = clearanceStack({ min: bore.min, max: bore.max }, { min: journal.min, max: journal.max });
  if (!stack.ok) return stack;
  const source = 'Least bore less greatest journal, and the reverse: checked against TM 5-3895-346-14.';
  const end = (key: string, label: string, value: number) => measured(key, label, value, 'mm', FINE, { source });
  return worked([
    end('sizes-least', 'Least clearance that the sizes allow', stack.value.min),
    end('sizes-greatest', 'Greatest clearance that the sizes allow', stack.value.max),
  ]);
}
