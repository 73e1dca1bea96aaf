import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Select } from '@/components/ui/Select';
import { TextArea } from '@/components/ui/TextArea';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { FLAG_KINDS, LONGEST_FLAG } from '@/domain/flags/flags';
import { PlainPhotos, type OpenField } from './PlainPhotos';

export interface FlagTyped {
  step: string;
  kind: string;
  text: string;
}

/** Raises a flag on a sheet. A plain form: it must work with gloves, on any device, without a script. */
export function FlagForm({
  number,
  steps,
  typed,
  errors,
  kept,
  open,
  children,
}: {
  number: string;
  steps: readonly { id: string; number: number; title: string }[];
  typed: FlagTyped;
  /** What was refused, by field. */
  errors: Readonly<Record<string, string>>;
  /** Photos that came with a form that was refused. */
  kept: readonly UploadedPhoto[];
  /** Words that came without their photo, and why it was not taken. */
  open: readonly OpenField[];
  /** Chooses photos, where a script runs. */
  children?: ReactNode;
}) {
  return (
    <form method="post" encType="multipart/form-data" className="px-4 py-6 sm:px-9 sm:py-7">
      <div className="flex max-w-[38rem] flex-col gap-5">
        <Select
          name="step"
          label="Where"
          error={errors['step']}
          defaultValue={typed.step}
          options={[
            { value: '', label: 'The whole sheet' },
            ...steps.map((step) => ({ value: step.id, label: `Step ${step.number}: ${step.title}` })),
          ]}
        />
        <Select
          name="kind"
          label="What"
          error={errors['kind']}
          defaultValue={typed.kind}
          options={Object.entries(FLAG_KINDS).map(([value, label]) => ({ value, label }))}
        />
        <TextArea
          name="text"
          label="In your words"
          hint="What did you see, and what did you expect? Whoever answers was not standing there."
          rows={5}
          required
          maxLength={LONGEST_FLAG}
          error={errors['text']}
          defaultValue={typed.text}
        />
        {children}
        <noscript>
          <PlainPhotos kept={kept} open={open} errors={errors} />
        </noscript>
        <div className="flex flex-wrap gap-3">
          <Button type="submit" kind="main">
            Raise the flag
          </Button>
          <ButtonLink href={`/procedures/${number}${typed.step ? `#step-${typed.step}` : ''}`}>
            Back to the sheet
          </ButtonLink>
        </div>
      </div>
    </form>
  );
}
