import { useController } from 'react-hook-form';
import { useState } from 'react';
import { Checkbox } from '@/components/ui/Checkbox';
import { ENGINE_TO_FILL_IN } from '@/domain/procedure/fillIn';
import { SKILLS, SYSTEMS } from '@/domain/procedure/schema';
import { problemAt } from '@/domain/writing/problems';
import { useDesk, useDraftForm } from './desk';
import { ChoiceBox, LongBox, TextBox } from './fields';
import type { FieldHandle } from './fieldHandle';
import { InsertRow } from './InsertRow';
import { fieldId } from './places';
import { Prose } from './Prose';

const SYSTEM_OPTIONS = Object.entries(SYSTEMS).map(([value, label]) => ({ value, label }));
const SKILL_WORDS = { apprentice: 'an apprentice', technician: 'a technician', senior: 'a senior technician' };
const SKILL_OPTIONS = SKILLS.map((value) => ({ value, label: SKILL_WORDS[value] }));

function Engines() {
  const { engines, problems } = useDesk();
  const { control } = useDraftForm();
  const { field } = useController({ control, name: 'engines' });
  // What stands there for an engine until one is chosen is no engine, and goes with the first choice.
  const chosen = (Array.isArray(field.value) ? field.value : []).filter((key) => key !== ENGINE_TO_FILL_IN);
  const known = engines.map(({ key }) => key);
  const all = [...engines, ...chosen.filter((key) => !known.includes(key)).map((key) => ({ key, name: key }))];
  const error = problemAt(problems, 'engines');
  return (
    <fieldset id={fieldId('engines')} tabIndex={-1}>
      <legend className="mb-1.5 font-medium">Engines</legend>
      <div className="flex flex-wrap gap-x-8">
        {all.map(({ key, name }) => (
          <Checkbox
            key={key}
            label={name}
            checked={chosen.includes(key)}
            onChange={(event) =>
              field.onChange(event.target.checked ? [...chosen, key] : chosen.filter((other) => other !== key))
            }
          />
        ))}
      </div>
      {error && <p className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">{error}</p>}
    </fieldset>
  );
}

function Critical() {
  const { control } = useDraftForm();
  const { field } = useController({ control, name: 'critical' });
  return (
    <Checkbox
      id={fieldId('critical')}
      className="sm:col-span-full"
      label="A mistake here can hurt somebody or destroy an engine, so every change needs two editors"
      checked={field.value === true}
      onChange={(event) => field.onChange(event.target.checked)}
    />
  );
}

/** What the sheet is: the words and facts of its head, and its introduction. */
export function SheetFields() {
  const [field, setField] = useState<FieldHandle | null>(null);
  return (
    <div className="flex flex-col gap-5">
      <h2 className="text-lead">The sheet</h2>
      <TextBox
        path="title"
        label="Title"
        hint="The task, as somebody would ask for it."
        className="font-serif font-bold"
      />
      <LongBox path="summary" label="Summary" hint="One sentence: what is done, and what comes out of it." rows={3} />
      <div className="grid gap-5 sm:grid-cols-3">
        <ChoiceBox path="system" label="System" options={SYSTEM_OPTIONS} />
        <ChoiceBox path="skill" label="Written for" options={SKILL_OPTIONS} />
        <TextBox path="minutes" label="Bench time" unit="min" />
        <Critical />
      </div>
      <Engines />
      <div className="flex flex-col gap-2.5">
        <Prose
          path="intro"
          where="intro"
          label="Introduction"
          hint="Before the first step: when this job is done, and why."
          onField={setField}
        />
        <InsertRow field={field} />
      </div>
    </div>
  );
}
