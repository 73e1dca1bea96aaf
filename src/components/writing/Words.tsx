import { Fragment } from 'react';
import type { WordRun } from '@/domain/revision/types';

/** Words with what was added underlined and what was taken away struck through. */
export const Words = ({ runs }: { runs: readonly WordRun[] }) =>
  runs.map((run, i) =>
    run.kind === 'added' ? (
      <ins key={i} className="bg-wash decoration-petrol decoration-2 underline-offset-4">
        {run.text}
      </ins>
    ) : run.kind === 'removed' ? (
      <del key={i} className="removed">
        {run.text}
      </del>
    ) : (
      <Fragment key={i}>{run.text}</Fragment>
    ),
  );
