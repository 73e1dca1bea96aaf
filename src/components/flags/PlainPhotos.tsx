import { Checkbox } from '@/components/ui/Checkbox';
import { Field } from '@/components/ui/Field';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { FORM_PHOTOS, LONGEST_ALT } from '@/domain/photos/photos';

/** A field for a file that came back: its words, and why the file was not taken. */
export interface OpenField {
  words: string;
  error: string | null;
}

/** Photos of a plain form, where no script runs: those that were kept from an earlier try, and room for more. */
export function PlainPhotos({
  kept,
  open,
  errors,
}: {
  kept: readonly UploadedPhoto[];
  open: readonly OpenField[];
  errors: Readonly<Record<string, string>>;
}) {
  const free = Array.from({ length: Math.max(0, FORM_PHOTOS - kept.length) }, (_, i) => i);
  return (
    <fieldset className="plain-photos">
      <legend className="font-medium">Photos</legend>
      <p className="text-small text-ink-2">May be left out. Up to {FORM_PHOTOS}, 15 MB each.</p>
      {kept.map(({ id, small, alt }, i) => (
        <div key={id} className="picked" data-state="there">
          <span className="picked-frame">
            <img src={small} alt="" />
          </span>
          <div className="min-w-0">
            <Field
              name={`alt-${id}`}
              label={`What photo ${i + 1} shows`}
              maxLength={LONGEST_ALT}
              defaultValue={alt}
              error={errors[`alt-${id}`]}
            />
            <Checkbox label="Send it along" name="photo" id={`photo-${id}`} value={id} defaultChecked />
          </div>
        </div>
      ))}
      {free.map((i) => (
        <div key={i} className="flex flex-col gap-2.5">
          <Field
            type="file"
            accept="image/*"
            name={`file-${i}`}
            label={`Photo ${kept.length + i + 1}`}
            error={open[i]?.error ?? undefined}
          />
          <Field
            name={`file-alt-${i}`}
            label={`What photo ${kept.length + i + 1} shows`}
            maxLength={LONGEST_ALT}
            defaultValue={open[i]?.words ?? ''}
          />
        </div>
      ))}
    </fieldset>
  );
}
