/** The shops that somebody answers for, each a link; nothing where there is one. */
export function ShopChoice({
  shops,
  chosen,
  addressOf,
}: {
  /** An id of null stands for all of them. */
  shops: readonly { id: string | null; name: string }[];
  chosen: string | null;
  addressOf: (id: string | null) => string;
}) {
  if (shops.length < 2) return null;
  return (
    <nav aria-label="Shops" className="mt-3 print:hidden">
      <ul className="flex flex-wrap gap-x-6">
        {shops.map(({ id, name }) => (
          <li key={id ?? ''}>
            <a
              href={addressOf(id)}
              aria-current={id === chosen ? 'page' : undefined}
              className="flex min-h-touch items-center aria-[current]:font-semibold aria-[current]:text-ink aria-[current]:no-underline"
            >
              {name}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  );
}
