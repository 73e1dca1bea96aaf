import { Notice } from '@/components/ui/Notice';
import type { Origin } from '@/domain/api/schemas/imports';
import { LeftOutTable } from './LeftOutTable';
import { counted } from './words';

/** What a new procedure was begun from, and what that asks of whoever writes or reviews it. */
export function OriginNote({ origin, className }: { origin: Origin | null; className?: string }) {
  if (!origin) return null;
  const look = { ...(className ? { className } : {}) };
  if (origin.kind === 'copy')
    return (
      <Notice {...look} title={`Copied from ${origin.number} revision ${origin.letter}`}>
        <p>
          Its torques and limits came over with it, and nobody has checked them for this job. Look at each of them, and
          at its source, before you let it stand.
        </p>
      </Notice>
    );
  const { name, leftOut } = origin;
  return (
    <Notice {...look} title={name ? `Imported from “${name}”` : 'Imported from a text that was pasted'}>
      <p>Nobody has checked its numbers and cautions for this book.</p>
      {leftOut.length > 0 && (
        <details className="mt-1">
          <summary className="flex min-h-touch cursor-pointer items-center underline underline-offset-[3px]">
            {counted(leftOut.length, 'passage')} not as in the document
          </summary>
          <LeftOutTable leftOut={leftOut} />
        </details>
      )}
    </Notice>
  );
}
