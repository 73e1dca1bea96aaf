import { gapByFactor, gapElsewhere } from '../../measure/rings';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, measured } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

type Asked = Pick<Values<typeof fields>, 'bore' | 'measuredIn' | 'factor'>;

/** What every gap gains or loses between the bore it was measured in and the one it runs in, m; 0 where it is the same. */
export function gapShift({ bore, measuredIn }: Asked): Worked<number> {
  if (measuredIn === undefined) return worked(0);
  if (bore === undefined) return refused({ field: 'bore', message: 'Say which bore the rings will run in.' });
  const shift = gapElsewhere({ gap: 0, measuredIn, runsIn: bore });
  return shift.ok ? shift : inBoxes(shift, { runsIn: 'bore', gap: 'bore' });
}

/** The least gap of the top ring by its maker's factor, m; null where there is no factor. */
export function gapWanted({ bore, factor }: Asked): Worked<number | null> {
  if (factor === undefined) return worked(null);
  return bore === undefined
    ? refused({ field: 'bore', message: 'The factor needs the bore.' })
    : gapByFactor(bore, factor);
}

export function factorResult({ bore = 0, factor = 0 }: Asked, gap: number): Result {
  const shown = show(gap, 'mm', 0.01);
  return measured('by-factor', 'Least gap of the top ring by the factor', gap, 'mm', 0.01, {
    formula: said`bore · factor = ${show(bore, 'mm', 0.001)} · ${factor} = ${shown}`,
    source: "The factor is the ring maker's; the rule is quoted from a forum's copy of a ring maker's table.",
    main: true,
  });
}
