import { dayOf } from '@/components/ui/day';
import type { Remark } from '@/domain/api/schemas';
import { REMARK_WORDS } from './words';

/** What a reviewer wrote, where it belongs. */
export const RemarkNote = ({ remark, about }: { remark: Remark; about?: string | undefined }) => (
  <div className="remark-note">
    <b className="font-semibold">{remark.person.name}</b> {REMARK_WORDS[remark.kind]} on {dayOf(remark.at)}
    {about && `, at ${about}`}: {remark.text}
  </div>
);

/** Remarks whose place is shown nowhere on the page, and those on the whole. */
export function unplaced(remarks: readonly Remark[], steps: ReadonlySet<string>, paths: ReadonlySet<string>): Remark[] {
  return remarks.filter(
    ({ anchor }) => anchor === null || !(anchor.startsWith('step:') ? steps.has(anchor.slice(5)) : paths.has(anchor)),
  );
}
