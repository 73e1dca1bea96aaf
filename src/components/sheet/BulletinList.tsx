import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { dayOf } from '@/components/ui/day';
import { BulletinText } from './BulletinText';
import { bulletinTitle } from './bulletinWords';
import { ReadThis } from './ReadThis';

/** Bulletins of several sheets, each with the sheet it is about and what its reader has done. */
export const BulletinList = ({ label, bulletins }: { label: string; bulletins: readonly Bulletin[] }) => (
  <ul aria-label={label}>
    {bulletins.map((bulletin) => (
      <li
        key={bulletin.id}
        className="grid gap-x-8 gap-y-3 border-t border-hair py-5 first:border-t-0 md:grid-cols-[14rem_1fr] lg:grid-cols-[15rem_1fr_auto]"
      >
        <p className="leading-snug">
          <a href={`/procedures/${bulletin.number}`} className="font-serif text-[1.0625rem] font-bold">
            {bulletin.title}
          </a>
          <span className="mt-1 block text-small text-ink-2">
            {bulletin.number}, {bulletin.book.name}
          </span>
        </p>
        <div>
          <h3 className="mb-1 font-sans text-[1.0625rem] font-semibold">{bulletinTitle(bulletin)}</h3>
          <BulletinText bulletin={bulletin} />
        </div>
        <div className="self-end md:col-start-2 lg:col-start-auto lg:text-right">
          {bulletin.unread && (
            <ReadThis
              bulletin={bulletin.id}
              back="/bulletins"
              about={`${bulletin.number}, ${bulletinTitle(bulletin)}`}
            />
          )}
          {bulletin.signedAt && <p className="text-ink-2">You signed on {dayOf(bulletin.signedAt)}</p>}
        </div>
      </li>
    ))}
  </ul>
);
