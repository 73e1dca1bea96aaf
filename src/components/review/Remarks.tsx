import { dayOf } from '@/components/ui/day';
import type { Remark } from '@/domain/api/schemas/proposals';
import { REMARK_WORDS } from './words';

/** What a reviewer wrote, where it belongs; `about` says so where it cannot stand there. */
export const RemarkNote = ({ remark, about }: { remark: Remark; about?: string | undefined }) => (
  <div className="remark-note">
    <b className="font-semibold">{remark.person.name}</b> {REMARK_WORDS[remark.kind]} on {dayOf(remark.at)}
    {about && `, ${about}`}: {remark.text}
  </div>
);
