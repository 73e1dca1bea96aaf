import { dayOf } from '@/components/ui/day';

/** "1 Dec 2026, 14:58 UTC". */
const utc = (iso: string) => `${dayOf(iso)}, ${iso.slice(11, 16)} UTC`;

/** A day and a time of day: by UTC, and by the reader's own clock once `localMoments` has run. */
export const Moment = ({ at }: { at: string }) => (
  <time dateTime={at} data-moment="">
    {utc(at)}
  </time>
);
