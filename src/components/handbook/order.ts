/** What the handbook needs to know of a page to list it. `id` is the last part of its address. */
export interface ListedPage {
  id: string;
  data: { title: string; summary: string; order: number };
}

export const inOrder = <Page extends ListedPage>(pages: readonly Page[]): Page[] =>
  [...pages].sort((a, b) => a.data.order - b.data.order);

/** The pages before and after one, in the order of the handbook; undefined at its ends. */
export function neighbours<Page extends ListedPage>(pages: readonly Page[], id: string) {
  const ordered = inOrder(pages);
  const at = ordered.findIndex((page) => page.id === id);
  return { number: at + 1, of: ordered.length, before: ordered[at - 1], after: at < 0 ? undefined : ordered[at + 1] };
}
