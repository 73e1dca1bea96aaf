import { useEffect, useMemo, useRef, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Select } from '@/components/ui/Select';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import type { Worksheet as Described } from '@/domain/worksheets/worksheet';
import type { Units } from './asked';
import { byField, filledBy, type BoundLimit } from './bound';
import { useCase } from './useCase';
import { Worksheet } from './Worksheet';

const NOTHING = {};

/** Which limits the readings are judged by; a choice where the sheet serves several engines. */
function Judged({
  worksheet,
  fields,
  chosen,
  units,
  onChoose,
}: {
  worksheet: Described;
  fields: Map<string, BoundLimit[]>;
  chosen: Record<string, number>;
  units: Units;
  onChoose: (field: string, index: number) => void;
}) {
  const choices = [...fields.values()].filter((limits) => limits.length > 1).length;
  const judges = (field: string) =>
    choices > 1 ? `${worksheet.fields[field]?.label ?? 'Readings'}, judged by` : 'Judged by';
  return (
    <div className="flex flex-col gap-3">
      {[...fields].map(([field, limits]) => {
        const limit = limits[chosen[field] ?? 0] ?? limits[0];
        return limits.length > 1 ? (
          <Select
            key={field}
            name={`limit-${field}`}
            label={judges(field)}
            value={String(chosen[field] ?? 0)}
            options={limits.map(({ name, text }, i) => ({ value: String(i), label: `${name}, ${text[units]}` }))}
            onChange={(event) => onChoose(field, Number(event.target.value))}
          />
        ) : (
          <p key={field} className="leading-snug">
            <span className="text-ink-2">{limit?.name} </span>
            <b className="font-semibold">{limit?.text[units]}</b>
          </p>
        );
      })}
    </div>
  );
}

/** A worksheet opened inside a sheet: the sheet's own limits stand in it, only readings are typed. Nothing is kept. */
export function OnSheet({
  worksheet,
  limits,
  units,
  rules,
  onClose,
}: {
  worksheet: Described;
  limits: readonly BoundLimit[];
  units: Units;
  /** null where what the shop has set could not be fetched. */
  rules: ShopRules | null;
  onClose: () => void;
}) {
  const fields = useMemo(() => byField(limits), [limits]);
  const [chosen, choose] = useState<Record<string, number>>({});
  const fixed = useMemo(
    () =>
      filledBy(
        worksheet.fields,
        [...fields].flatMap(([field, all]) => all[chosen[field] ?? 0] ?? []),
      ),
    [worksheet, fields, chosen],
  );
  const now = useCase(worksheet, { typed: NOTHING, units, rules: rules ?? NOTHING, fixed });
  const hidden = useMemo(() => [...fields.keys(), ...Object.keys(fixed)], [fields, fixed]);
  const section = useRef<HTMLElement>(null);
  // Whoever opened it wants to type.
  useEffect(() => section.current?.querySelector<HTMLElement>('input, select')?.focus(), []);
  return (
    <section ref={section} aria-label={worksheet.title} className="work-inset">
      <div className="flex flex-wrap items-start gap-3 border-b border-rule px-4 py-3">
        <div className="min-w-0 flex-1">
          <p className="font-serif text-lead font-bold">{worksheet.title}</p>
          <p className="text-small text-ink-2">Nothing that you type here is kept.</p>
        </div>
        <Button onClick={onClose}>Close</Button>
      </div>
      {rules === null && (
        <p className="border-b border-hair px-4 py-3 font-medium leading-snug">
          What your shop has set for its rules of thumb could not be fetched. The usual values stand.
        </p>
      )}
      {fields.size > 0 && (
        <div className="border-b border-hair px-4 py-3">
          <Judged
            worksheet={worksheet}
            fields={fields}
            chosen={chosen}
            units={now.units}
            onChoose={(field, i) => choose({ ...chosen, [field]: i })}
          />
        </div>
      )}
      <Worksheet worksheet={worksheet} now={now} rules={rules ?? NOTHING} hidden={hidden} />
    </section>
  );
}
