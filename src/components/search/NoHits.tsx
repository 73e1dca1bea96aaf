import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { EmptyState } from '@/components/ui/EmptyState';

/** Nothing found: what to try, and who can write what is missing. */
export function NoHits({
  query,
  filtered,
  mayWrite,
  onClear,
}: {
  query: string;
  filtered: boolean;
  mayWrite: boolean;
  onClear: () => void;
}) {
  const what = query.trim() ? `for “${query.trim()}”` : 'here';
  return (
    <div className="frame">
      <EmptyState title={filtered ? `No sheet ${what} with these filters` : `The book has no sheet ${what}`}>
        <p>
          {filtered
            ? 'Clear the filters to look through the whole book.'
            : 'Fewer words find more. A number needs its unit: 10 N·m, 14 thou, 3 bar.'}
        </p>
        {filtered && (
          <Button kind="main" onClick={onClear}>
            Clear the filters
          </Button>
        )}
        {mayWrite ? (
          <p>
            Is the job done in your shop, and nobody wrote it down?{' '}
            <ButtonLink href="/procedures/new" kind={filtered ? 'plain' : 'main'} className="mt-3">
              Write a new procedure
            </ButtonLink>
          </p>
        ) : (
          <p>Ask a technician how it is done in your shop, and to write it down.</p>
        )}
      </EmptyState>
    </div>
  );
}
