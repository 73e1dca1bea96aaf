import { useEffect, useRef } from 'react';
import { Checkbox } from '@/components/ui/Checkbox';
import { classes } from '@/components/ui/classes';
import { SKILLS, SYSTEMS } from '@/domain/procedure/systems';
import type { Facets, Filters } from '@/domain/search/filters';

const SKILL_NAMES: Record<(typeof SKILLS)[number], string> = {
  apprentice: 'Apprentice',
  technician: 'Technician',
  senior: 'Senior technician',
};

export interface Choice {
  key: string;
  name: string;
}

/** Engine, system and skill, each choice with how many sheets it would show. Folded away where there is no room beside the list. */
export function FilterPanel({
  filters,
  facets,
  whole,
  engines,
  onChange,
}: {
  filters: Filters;
  facets: Facets;
  /** Counts of the whole book: what it has no sheet for is no choice. */
  whole: Facets;
  engines: readonly Choice[];
  onChange: (filters: Filters) => void;
}) {
  const panel = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    const roomy = matchMedia('(min-width: 1024px)');
    const fit = (): void => {
      if (panel.current) panel.current.open = roomy.matches;
    };
    fit();
    roomy.addEventListener('change', fit);
    return () => {
      roomy.removeEventListener('change', fit);
    };
  }, []);
  const groups: { name: keyof Filters; title: string; choices: readonly Choice[] }[] = [
    { name: 'engine', title: 'Engine', choices: engines },
    { name: 'system', title: 'System', choices: Object.entries(SYSTEMS).map(([key, name]) => ({ key, name })) },
    { name: 'fit', title: 'Fit for', choices: SKILLS.map((key) => ({ key, name: SKILL_NAMES[key] })) },
  ];
  const set = filters.engine.length + filters.system.length + filters.fit.length;
  return (
    <details ref={panel} className="look-up-filters group max-lg:frame max-lg:px-4" suppressHydrationWarning>
      <summary className="flex min-h-touch cursor-pointer items-center justify-between font-semibold lg:hidden">
        <span>{set === 0 ? 'Filters: engine, system, skill' : `Filters, ${set} set`}</span>
        <span className="font-medium text-ink-2 underline underline-offset-[3px]">
          <span className="group-open:hidden">Show</span>
          <span className="hidden group-open:inline">Hide</span>
        </span>
      </summary>
      <div className="grid gap-x-8 max-lg:border-t max-lg:border-hair max-lg:pb-3 max-lg:pt-3 sm:max-lg:grid-cols-3">
        {groups.map(({ name, title, choices }) => (
          <fieldset key={name} className="mb-5 min-w-0">
            <legend className="mb-1 font-serif font-bold">{title}</legend>
            {choices
              .filter(({ key }) => whole[name][key] !== undefined)
              .map(({ key, name: said }) => {
                const chosen: readonly string[] = filters[name];
                const count = facets[name][key] ?? 0;
                return (
                  <Checkbox
                    key={key}
                    name={name}
                    value={key}
                    checked={chosen.includes(key)}
                    className={classes(
                      '!min-h-9 max-lg:!min-h-touch',
                      // A long list of noughts is no help on a phone.
                      count === 0 && !chosen.includes(key) && 'max-lg:hidden',
                    )}
                    label={<span className={count === 0 ? 'text-ink-2' : undefined}>{said}</span>}
                    after={count}
                    onChange={({ target }) => {
                      const others = chosen.filter((one) => one !== key);
                      onChange({ ...filters, [name]: target.checked ? [...others, key] : others });
                    }}
                  />
                );
              })}
          </fieldset>
        ))}
      </div>
    </details>
  );
}
