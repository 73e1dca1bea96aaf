import type { BothUnits } from '../measure/format';
import type { Worked } from '../measure/worked';
import type { Outcome } from './outcome';
import { readInputs, type RawInputs, type Reading } from './readInputs';
import type { Worksheet } from './worksheet';

export interface WorkedOut {
  outcome: Worked<Outcome>;
  /** How each box was read, by its path. */
  understood: Record<string, BothUnits>;
}

/** Reads raw inputs and works them out. Problems carry the path of their box. */
export function workOut(worksheet: Worksheet, raw: RawInputs, reading: Reading = {}): WorkedOut {
  const { inputs, understood } = readInputs(worksheet.fields, raw, reading);
  return { outcome: inputs.ok ? worksheet.compute(inputs.value) : inputs, understood };
}
