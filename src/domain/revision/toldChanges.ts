import type { Procedure } from '../procedure/types';
import { valueWords } from './valueWords';
import { stepLine } from './changeWords';
import { differences } from './compare';
import { inOrder, SHEET_IS_CRITICAL } from './critical';

/** As many changes as somebody reads before signing; the comparison shows them all. */
const MOST = 8;

const listed = (words: readonly string[]) =>
  [...words.slice(0, MOST), ...(words.length > MOST ? [`and ${words.length - MOST} more`] : [])].join('; ');

/**
 * What a critical change does, for those who have worked from the text before: its critical reasons, each with the values
 * then and now. "a torque changes: Cover bolt torque, 10 to 12 N·m". On a sheet that is marked critical whatever else
 * changes is told too. Empty for a change that is not critical.
 */
export function toldChanges(from: Procedure, to: Procedure): string[] {
  const { values, steps, reasons } = differences(from, to);
  const stepOf = (procedure: Procedure, id: string) => procedure.steps.find((step) => step.id === id);
  const others = [
    ...values.filter(({ reason }) => !reason).map(({ change }) => valueWords(change)),
    ...steps.flatMap(({ change }) =>
      stepLine(change, stepOf(from, change.id), stepOf(to, change.id)).map(({ what }) => what),
    ),
    ...(from.intro === to.intro ? [] : ['The introduction, reworded']),
  ];
  return inOrder(reasons).map((words) => {
    if (words === SHEET_IS_CRITICAL) return others.length > 0 ? `${words}, and this changes: ${listed(others)}` : words;
    const told = values.filter(
      ({ reason, change }) => reason?.words === words && change.path !== `${change.list}.${change.key}`,
    );
    const [what = ''] = words.split(': ');
    return told.length > 0 ? `${what}: ${listed(told.map(({ change }) => valueWords(change)))}` : words;
  });
}
