import { Segmented } from '@/components/ui/Segmented';

/**
 * Metric or inch, for this page at once and kept in the profile. A plain form without a script; with one
 * (`scripts/units.ts`), the page switches in place.
 */
export const UnitsSwitch = ({ units, back }: { units: 'metric' | 'inch'; back: string }) => (
  <form method="post" action="/profile/units" data-units-switch className="print:hidden">
    <input type="hidden" name="back" value={back} />
    <Segmented
      label="Units"
      name="units"
      value={units}
      segments={[
        { value: 'metric', label: 'N·m, mm', name: 'Metric units' },
        { value: 'inch', label: 'lbf, in', name: 'Inch units' },
      ]}
    />
  </form>
);
