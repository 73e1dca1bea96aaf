import { EmptyState } from '@/components/ui/EmptyState';
import { Cell, Row, Table } from '@/components/ui/Table';
import type { DraftVersion } from '@/domain/api/schemas/versions';
import { Moment } from './Moment';
import { becameWords, whatWords } from './versionWords';

const COLUMNS = [
  { key: 'n', label: 'Version' },
  { key: 'at', label: 'Kept' },
  { key: 'by', label: 'By' },
  { key: 'what', label: 'What changed' },
];

/** Earlier versions of a draft, latest first; each leads to what going back to it would change. */
export function VersionList({
  id,
  versions,
  next,
  me,
}: {
  id: string;
  versions: readonly DraftVersion[];
  /** Cursor of the older ones. */
  next: string | null;
  me: string;
}) {
  if (versions.length === 0)
    return (
      <EmptyState title="No version is kept yet">
        This draft has not been saved since it was begun. Write something, and it can be gone back on.
      </EmptyState>
    );
  return (
    <div className="px-4 py-3 sm:px-9">
      <Table caption="Versions of the draft" columns={COLUMNS}>
        {versions.map((version, place) => {
          const { n, at, person, what, current } = version;
          const became = becameWords(version);
          const changed = whatWords(what);
          return (
            <Row key={n}>
              <Cell className="whitespace-nowrap">
                <a
                  href={`/proposals/${id}/versions/${n}`}
                  className="-my-3 mr-2 inline-flex min-h-touch min-w-8 items-center font-serif text-lead font-bold"
                >
                  <span className="sr-only">Version </span>
                  {n}
                </a>
                {current && (
                  <span className="text-small text-ink-2">{place === 0 ? 'as it stands now' : 'the same as now'}</span>
                )}
              </Cell>
              <Cell label="Kept" className="whitespace-nowrap">
                <Moment at={at} />
              </Cell>
              <Cell label="By">{person.id === me ? 'You' : person.name}</Cell>
              <Cell label="What changed" className="sm:w-1/2">
                {became && <span className="font-semibold">{became}</span>}
                {became && changed && '. '}
                {changed}
                {!became && !changed && 'Nothing in words'}
              </Cell>
            </Row>
          );
        })}
      </Table>
      {next !== null && (
        <p className="border-t border-hair">
          <a href={`/proposals/${id}/versions?cursor=${next}`} className="inline-flex min-h-touch items-center">
            Older versions
          </a>
        </p>
      )}
    </div>
  );
}
