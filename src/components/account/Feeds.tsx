import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';

/** A feed that the person may have. */
export interface FeedRow {
  /** Null for the common book alone. */
  shopId: string | null;
  name: string;
  /** When its address was made; null where it has none. */
  madeAt: string | null;
}

/** What the last press came to, beside the feed it was about. */
export interface FeedAnswer {
  shopId: string | null;
  /** The whole new address, this once. */
  address?: string | undefined;
  conflict?: string | undefined;
}

function MadeOnce({ address }: { address: string }) {
  return (
    <Notice live="status" title="Address made">
      <p>Copy it now: it is not shown again. Whoever has it can read the feed.</p>
      <div className="mt-3 flex flex-col gap-3">
        <Field label="Feed address" name="address" readOnly value={address} data-copied-from="" className="bg-white" />
        <div className="flex flex-wrap items-center gap-4">
          <Button kind="main" data-copy="" data-needs-script="">
            Copy the address
          </Button>
          <p role="status" data-copy-said="" className="font-medium" />
        </div>
      </div>
    </Notice>
  );
}

function Feed({ feed, answer }: { feed: FeedRow; answer?: FeedAnswer | undefined }) {
  const { name, madeAt, shopId } = feed;
  const make = madeAt === null ? 'Make an address' : 'Replace the address';
  const revoked = answer && !answer.address && !answer.conflict;
  return (
    <form method="post" action="/profile#feed" className="flex flex-col gap-3">
      <input type="hidden" name="section" value="feed" />
      <input type="hidden" name="shop" value={shopId ?? ''} />
      <input type="hidden" name="standing" value={madeAt ?? ''} />
      <div>
        <h3 className="font-sans font-semibold">{name}</h3>
        <p className="text-ink-2">{madeAt === null ? 'No address.' : `Address made on ${dayOf(madeAt)}.`}</p>
      </div>
      {answer?.conflict && <Notice live="alert">{answer.conflict}</Notice>}
      {answer?.address && <MadeOnce address={answer.address} />}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" name="act" value="make" aria-label={`${make}: ${name}`}>
          {make}
        </Button>
        {madeAt !== null && (
          <Button type="submit" name="act" value="revoke" kind="quiet" aria-label={`Revoke: ${name}`}>
            Revoke
          </Button>
        )}
        {revoked && (
          <p role="status" className="font-medium">
            Revoked
          </p>
        )}
      </div>
    </form>
  );
}

/** The addresses under which a person's feed reader finds what was published, and how to use them. */
export function Feeds({ feeds, answer }: { feeds: readonly FeedRow[]; answer?: FeedAnswer | undefined }) {
  return (
    <section id="feed" className="grid gap-x-10 gap-y-4 px-4 py-7 sm:px-9 md:grid-cols-[18rem_minmax(0,28rem)]">
      <div>
        <h2 className="text-lead">Feed</h2>
        <div className="mt-1 flex flex-col gap-2 text-ink-2">
          <p>
            Tells a feed reader or a mail program what was published, withdrawn and brought back, with the reason. Add
            the address there as a new feed (Atom).
          </p>
          <p>
            The address works without a sign-in, so it tells titles and reasons and none of a sheet’s text; the link of
            each entry opens the sheet here. Signing out everywhere does not end it; revoke it when a device is lost.
          </p>
        </div>
      </div>
      <div className="flex flex-col gap-7">
        {feeds.length === 0 && <p>A feed needs a role in a shop or in the common book. Ask the owner of your shop.</p>}
        {feeds.map((feed) => (
          <Feed key={feed.shopId} feed={feed} answer={answer?.shopId === feed.shopId ? answer : undefined} />
        ))}
      </div>
    </section>
  );
}
