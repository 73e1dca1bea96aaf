import { Select } from '@/components/ui/Select';
import { DeleteEntry } from './DeleteEntry';
import { useDesk, useDraftForm } from './desk';
import { LongBox } from './fields';
import { useBox } from './useBox';
import { usesInWords } from '@/domain/writing/uses';

function ChooseDrawing({ index }: { index: number }) {
  const { drawings } = useDesk();
  const { getValues, setValue } = useDraftForm();
  const { id, value, set, error } = useBox(`figures.${index}.file`);
  const choose = (file: string) => {
    set(file);
    // The words the drawing has elsewhere are a start, and never write over words of the author's own.
    const known = drawings.find((drawing) => drawing.file === file);
    for (const field of ['alt', 'caption'] as const)
      if (known && !getValues(`figures.${index}.${field}`)?.trim())
        setValue(`figures.${index}.${field}`, known[field], { shouldDirty: true });
  };
  const files = drawings.map((drawing) => ({ value: drawing.file, label: drawing.caption }));
  return (
    <Select
      label="Drawing"
      name={`figures.${index}.file`}
      id={id}
      error={error}
      value={value}
      options={[
        ...(value ? [] : [{ value: '', label: 'Choose a drawing of the book' }]),
        ...files,
        ...(value && !files.some((file) => file.value === value) ? [{ value, label: value }] : []),
      ]}
      onChange={(event) => choose(event.target.value)}
    />
  );
}

/** Drawings that the steps show, chosen among those the book has. */
export function Figures() {
  const { draft } = useDesk();
  return draft.figures.map((figure, index) => {
    const key = figure['key'] ?? '';
    const uses = usesInWords(draft, 'figures', key);
    return (
      <section
        key={`${key}:${index}`}
        id={`f-figures-${index}`}
        tabIndex={-1}
        aria-label={`Drawing ${index + 1}: ${figure['caption'] || key}`}
        className="mb-6 grid gap-4 border-frame border-ink p-4 sm:grid-cols-[minmax(0,1fr)_minmax(0,1.3fr)]"
      >
        {/^[a-z0-9-]+\.svg$/.test(figure['file'] ?? '') ? (
          <img src={`/figures/${figure['file']}`} alt="" className="w-full self-start border border-rule bg-white" />
        ) : (
          <p className="self-center text-ink-2">The drawing shows here once it is chosen.</p>
        )}
        <div className="flex flex-col gap-4">
          <ChooseDrawing index={index} />
          <LongBox path={`figures.${index}.caption`} label="Caption" />
          <LongBox
            path={`figures.${index}.alt`}
            label="What it shows"
            hint="For somebody who cannot see it."
            rows={4}
          />
          <div className="flex items-center justify-between gap-4">
            <span className="text-small text-ink-2">{uses ? `Used in ${uses}.` : 'Not used yet.'}</span>
            <DeleteEntry list="figures" entry={figure} />
          </div>
        </div>
      </section>
    );
  });
}
