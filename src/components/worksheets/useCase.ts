import { useEffect, useMemo, useState } from 'react';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import { nest } from '@/domain/worksheets/typedIn';
import { workOut } from '@/domain/worksheets/work';
import type { TypedIn, Worksheet } from '@/domain/worksheets/worksheet';
import { caseAddress, pinUnits, rowsShown, type Units } from './asked';

const ADDRESS_AFTER = 250;

/** Everything a worksheet on the screen knows: what stands in its boxes, how it was read, and what comes of it. */
export function useCase(
  worksheet: Worksheet,
  { typed: first, units: firstUnits, rules, fixed }: { typed: TypedIn; units: Units; rules: ShopRules; fixed: TypedIn },
) {
  const { fields } = worksheet;
  const [typed, setTyped] = useState<TypedIn>(first);
  const [units, setUnits] = useState(firstUnits);
  const [counts, setCounts] = useState(() => rowsShown(fields, first));
  const all = useMemo(() => ({ ...typed, ...fixed }), [typed, fixed]);
  const { outcome, understood } = useMemo(
    () => workOut(worksheet, nest(fields, all), { units, rules }),
    [worksheet, fields, all, units, rules],
  );
  const problems = new Map(outcome.ok ? [] : outcome.problems.map(({ field, message }) => [field, message]));

  return {
    typed: all,
    units,
    counts,
    outcome,
    understood,
    problems,
    blank: Object.values(typed).every((text) => text.trim() === ''),
    type: (path: string, text: string) => setTyped((before) => ({ ...before, [path]: text })),
    fill: (texts: TypedIn) => {
      setTyped(pinUnits(fields, texts, 'metric', units));
      setCounts(rowsShown(fields, texts));
    },
    count: (name: string, count: number) => {
      // Rows that are taken away take what stands in them along.
      setTyped((before) =>
        Object.fromEntries(
          Object.entries(before).filter(([path]) => {
            const [of, place] = path.split('.');
            return of !== name || Number(place) < count;
          }),
        ),
      );
      setCounts((before) => ({ ...before, [name]: count }));
    },
    switchTo: (next: Units) => {
      setTyped((before) => pinUnits(fields, before, units, next));
      setUnits(next);
    },
  };
}

export type Case = ReturnType<typeof useCase>;

/** Keeps the case in the address, so that it can be sent and found again. */
export function useAddress(worksheet: Worksheet, typed: TypedIn, units: Units): void {
  useEffect(() => {
    const timer = setTimeout(() => {
      const address = caseAddress(location.pathname, worksheet.fields, typed, units);
      if (location.pathname + location.search !== address)
        history.replaceState(history.state, '', address + location.hash);
    }, ADDRESS_AFTER);
    return () => clearTimeout(timer);
  }, [worksheet, typed, units]);
}
