import type { Comparison } from '@/domain/revision/types';

/** What comes into the author's text, one thing on a line. */
export function CameIn({ changes }: { changes: Comparison }) {
  const steps = changes.steps.filter(({ kind, moved }) => kind !== 'same' || moved);
  const title = (runs: Comparison['intro']) =>
    runs.flatMap(({ kind, text }) => (kind === 'removed' ? [] : [text])).join('') || 'Untitled';
  const did = { added: 'new', removed: 'taken away', edited: 'edited', same: 'moved' } as const;
  const intro = changes.intro.some(({ kind }) => kind !== 'same');
  if (changes.values.length + steps.length === 0 && !intro) return null;
  return (
    <ul className="mt-2 max-w-prose">
      {changes.values.map(({ path, label, from, to }) => (
        <li key={path} className="border-t border-hair py-1.5">
          {label}: {from === null ? '' : <del className="removed">{from}</del>}{' '}
          <strong className="font-semibold">{to ?? 'taken away'}</strong>
        </li>
      ))}
      {intro && <li className="border-t border-hair py-1.5">Introduction: edited</li>}
      {steps.map(({ id, kind, title: runs }) => (
        <li key={id} className="border-t border-hair py-1.5">
          Step “{title(kind === 'removed' ? runs.map((run) => ({ ...run, kind: 'same' })) : runs)}”:{' '}
          <strong className="font-semibold">{did[kind]}</strong>
        </li>
      ))}
    </ul>
  );
}
