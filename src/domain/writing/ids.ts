const LONGEST = 40;

/** "Draw the cover down, évenly" as `draw-the-cover-down-evenly`: what a key and a step's id may be. */
export function slugOf(words: string, otherwise: string): string {
  const slug = words
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}\s-]/gu, '')
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^[^a-z]+/, '')
    .slice(0, LONGEST)
    .replace(/-+$/, '');
  return slug || otherwise;
}

/** The slug of `words`, with a number behind it where it is taken. */
export function freeSlug(words: string, taken: readonly string[], otherwise: string): string {
  const slug = slugOf(words, otherwise);
  if (!taken.includes(slug)) return slug;
  for (let n = 2; ; n += 1) {
    const tail = `-${n}`;
    const tried = `${slug.slice(0, LONGEST - tail.length).replace(/-+$/, '')}${tail}`;
    if (!taken.includes(tried)) return tried;
  }
}

const PROVISIONAL = /^new-step(-\d+)?$/;

/** Whether a step has had no title yet, so that its id is still to come. */
export const isProvisional = (id: string): boolean => PROVISIONAL.test(id);

/** Id of a step that has no title yet. */
export const provisionalId = (taken: readonly string[]) => freeSlug('new step', taken, 'new-step');

/** The id that a step keeps from its first title on; any other id stays as it is. */
export function settledId(id: string, title: string, taken: readonly string[]): string {
  if (!isProvisional(id) || !title.trim()) return id;
  return freeSlug(
    title,
    taken.filter((other) => other !== id),
    'step',
  );
}
