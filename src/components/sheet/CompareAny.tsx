import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { Select } from '@/components/ui/Select';
import type { RevisionSummary } from '@/domain/api/schemas/book';

/** Two of all revisions, whichever are on the page. A plain form: the comparison has an address. */
export function CompareAny({
  number,
  letters,
}: {
  number: string;
  /** Latest first. */
  letters: readonly Pick<RevisionSummary, 'letter' | 'publishedAt'>[];
}) {
  if (letters.length < 2)
    return (
      <p className="px-4 py-4 text-ink-2 sm:px-9">
        This is the first revision. Once it is changed, any two can be compared here.
      </p>
    );
  const options = letters.map(({ letter, publishedAt }) => ({
    value: letter,
    label: `${letter}, ${dayOf(publishedAt)}`,
  }));
  return (
    <form
      action={`/procedures/${number}/compare`}
      className="flex flex-wrap items-end gap-x-4 gap-y-3 px-4 py-4 sm:px-9 print:hidden"
    >
      <Select label="From" name="from" options={options} defaultValue={letters[1]?.letter} fieldClass="w-40" />
      <Select label="To" name="to" options={options} defaultValue={letters[0]?.letter} fieldClass="w-40" />
      <Button type="submit">Compare these two</Button>
    </form>
  );
}
