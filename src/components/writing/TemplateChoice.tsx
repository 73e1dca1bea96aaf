import { counted } from '@/components/sheet/words';
import { SYSTEMS, type System } from '@/domain/procedure/systems';
import type { TemplateToChoose } from '@/domain/writing/templates';
import { Choice, FieldError } from './Way';

/** The templates under the systems that they are for, in the order of the systems. */
export function TemplateChoice({
  templates,
  chosen,
  error,
}: {
  templates: readonly TemplateToChoose[];
  chosen: string;
  error: string | undefined;
}) {
  const systems = (Object.keys(SYSTEMS) as System[]).filter((key) => templates.some(({ system }) => system === key));
  if (templates.length === 0) return <p className="text-ink-2">This release brings no templates.</p>;
  return (
    <fieldset aria-describedby={error ? 'template-error' : undefined}>
      <legend className="sr-only">Which template?</legend>
      <div className="grid gap-x-8 sm:grid-cols-[minmax(0,10rem)_minmax(0,1fr)]">
        {systems.map((key) => (
          <div key={key} className="contents">
            <p className="border-hair pt-2.5 text-small text-ink-2 sm:border-t">{SYSTEMS[key]}</p>
            <div className="border-b border-hair sm:border-b-0 sm:border-t">
              {templates
                .filter(({ system }) => system === key)
                .map(({ name, title, steps, cautions, holds }) => (
                  <Choice
                    key={name}
                    name="template"
                    value={name}
                    chosen={name === chosen}
                    label={title}
                    hint={`${counted(steps, 'step')}, ${counted(cautions, 'caution')}, ${counted(holds, 'hold point')}`}
                  />
                ))}
            </div>
          </div>
        ))}
      </div>
      <FieldError id="template-error" error={error} />
    </fieldset>
  );
}
