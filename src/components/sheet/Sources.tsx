import { SOURCE_KINDS, type Source } from '@/domain/procedure/schema';

const KINDS: Record<(typeof SOURCE_KINDS)[number], string> = {
  maker: "Maker's service information",
  standard: 'Standard',
  shop: 'Measured in the shop',
  practice: 'Common practice',
  demonstration: 'Invented for demonstration',
};

/** Where the values of the sheet come from. */
export function Sources({ sources }: { sources: readonly Source[] }) {
  return (
    <section className="break-inside-avoid px-4 py-5 sm:px-6">
      <h2 className="text-[1.0625rem]">Sources</h2>
      {sources.length === 0 && <p className="text-ink-2">This sheet names no source for its values.</p>}
      <ul className="mt-1">
        {sources.map((source) => (
          <li key={source.key} className="py-1 leading-snug">
            <span className="font-medium">{source.title}</span>
            <span className="text-ink-2">
              {' '}
              ({KINDS[source.kind].toLowerCase()}){source.detail && `. ${source.detail}`}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
