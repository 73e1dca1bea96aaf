import { Button } from '@/components/ui/Button';
import { Select, type Option } from '@/components/ui/Select';

/** Which book; a plain form, so that the view has an address. The order of the desk goes with it. */
export const DeskFilter = ({ books, book, sort }: { books: readonly Option[]; book: string; sort: string | null }) => (
  <form action="/review-desk" className="flex flex-wrap items-end gap-2.5">
    <Select
      label="Book"
      name="book"
      options={[{ value: '', label: 'All books' }, ...books]}
      defaultValue={book}
      fieldClass="w-64 max-w-full"
    />
    {sort && <input type="hidden" name="sort" value={sort} />}
    <Button type="submit">Show</Button>
  </form>
);
