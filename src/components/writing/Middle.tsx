import type { Comparison } from '@/domain/revision/types';
import { useDesk } from './desk';
import { ListEditor } from './ListEditor';
import { RemarksHere } from './Returned';
import { SheetFields } from './SheetFields';
import { StepEditor } from './StepEditor';
import { WhatChanges } from './WhatChanges';

/** The chosen part of the sheet. */
export function Middle({ changes, id }: { changes: Comparison | undefined; id: string }) {
  const { place, draft, baseLetter, problems } = useDesk();
  if (place === 'changes') return <WhatChanges changes={changes} id={id} base={baseLetter} old={problems.length > 0} />;
  if (place === 'sheet') return <SheetFields />;
  if ('list' in place)
    return (
      <div className="flex flex-col gap-4">
        <RemarksHere anchor={place.list} />
        <ListEditor key={place.list} list={place.list} />
      </div>
    );
  const index = draft.steps.findIndex((step) => step.id === place.step);
  return <StepEditor index={index} />;
}
