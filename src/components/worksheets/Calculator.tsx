import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { keepUnits } from '@/components/sheet/keepUnits';
import { Segmented } from '@/components/ui/Segmented';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import { worksheetNamed } from '@/domain/worksheets/registry';
import type { TypedIn, Worksheet as Described } from '@/domain/worksheets/worksheet';
import { caseAddress, type Units } from './asked';
import { useAddress, useCase } from './useCase';
import { Worksheet } from './Worksheet';

export interface CalculatorProps {
  name: string;
  /** What the address brings, by box. */
  typed: TypedIn;
  units: Units;
  rules: ShopRules;
  /** Whether the reader may set rules of thumb for the shop. */
  setsRules: boolean;
}

const NOTHING: TypedIn = {};

/** A worksheet as a page of the handbook. Without a script it is a form that the server answers with the same page. */
export function Calculator({ name, ...props }: CalculatorProps) {
  const worksheet = worksheetNamed(name);
  return worksheet ? <Named worksheet={worksheet} {...props} /> : null;
}

function Named({
  worksheet,
  typed,
  units: first,
  rules,
  setsRules,
}: Omit<CalculatorProps, 'name'> & { worksheet: Described }) {
  const now = useCase(worksheet, { typed, units: first, rules, fixed: NOTHING });
  const [said, say] = useState('');
  useAddress(worksheet, now.typed, now.units);
  // A case that was sent in other units than the reader's own is drawn in them too.
  useEffect(() => {
    document.documentElement.dataset['units'] = now.units;
  }, [now.units]);
  const copy = () => {
    const link = location.origin + caseAddress(location.pathname, worksheet.fields, now.typed, now.units);
    void navigator.clipboard
      .writeText(link)
      .then(() => say('Link copied'))
      .catch(() => say('The link stands in the address of this page.'));
  };
  return (
    <form method="get" onSubmit={(event) => event.preventDefault()}>
      <input type="hidden" name="units" value={now.units} />
      <div className="flex flex-wrap items-center gap-2.5 border-b-frame border-ink bg-sheet px-4 pb-4 sm:pb-5 sm:px-9 print:hidden">
        <button
          type="submit"
          data-without-script=""
          className="min-h-touch rounded bg-petrol px-5 font-semibold text-white"
        >
          Work it out
        </button>
        <Button data-needs-script="" onClick={() => now.fill(worksheet.example)}>
          Try a worked case
        </Button>
        <Button data-needs-script="" disabled={now.blank} onClick={copy}>
          Copy link
        </Button>
        <Button data-needs-script="" disabled={now.blank} onClick={() => now.fill(NOTHING)}>
          Clear
        </Button>
        <Button data-needs-script="" onClick={() => print()}>
          Print
        </Button>
        <span role="status" className="text-ink-2">
          {said}
        </span>
        <div data-needs-script="" className="sm:ml-auto">
          <Segmented
            label="Units"
            name="units"
            value={now.units}
            segments={[
              { value: 'metric', label: 'N·m, mm', name: 'Metric units' },
              { value: 'inch', label: 'lbf, in', name: 'Inch units' },
            ]}
            onChoose={(units) => {
              now.switchTo(units as Units);
              keepUnits(units);
            }}
          />
        </div>
      </div>
      <Worksheet worksheet={worksheet} now={now} rules={rules} setsRules={setsRules} />
    </form>
  );
}
