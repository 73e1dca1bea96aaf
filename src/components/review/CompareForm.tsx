import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { Select } from '@/components/ui/Select';
import type { RevisionSummary } from '@/domain/api/schemas/book';

/** Which two revisions; a plain form, so that the comparison has an address. */
export function CompareForm({
  number,
  revisions,
  from,
  to,
}: {
  number: string;
  revisions: readonly Pick<RevisionSummary, 'letter' | 'publishedAt'>[];
  from: string;
  to: string;
}) {
  const options = revisions.map(({ letter, publishedAt }) => ({
    value: letter,
    label: `${letter}, ${dayOf(publishedAt)}`,
  }));
  return (
    <form action={`/procedures/${number}/compare`} className="compare-form print:hidden">
      <Select label="From" name="from" options={options} defaultValue={from} fieldClass="sm:w-44" />
      <Select label="To" name="to" options={options} defaultValue={to} fieldClass="sm:w-44" />
      <Button type="submit">Compare</Button>
    </form>
  );
}
