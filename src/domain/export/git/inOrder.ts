/** Something that happened to one procedure. Withdrawals and bringings back come in the order in which they were written. */
export interface Happening {
  kind: 'published' | 'withdrawn' | 'brought back';
  /** ISO 8601 in UTC. */
  at: string;
  number: string;
}

const byNumber = (a: Happening, b: Happening) => (a.number < b.number ? -1 : a.number > b.number ? 1 : 0);
const byTime = (a: Happening, b: Happening) => (a.at < b.at ? -1 : a.at > b.at ? 1 : byNumber(a, b));

/**
 * What happened, oldest first; at one instant by number. Where one procedure was published and withdrawn or brought back
 * within one instant, the order is the one that can have been: nothing is published while a sheet is withdrawn.
 *
 * @param happenings of each procedure, publications by letter
 */
export function inOrder<H extends Happening>(happenings: readonly H[]): H[] {
  const sorted = [...happenings].sort(byTime);
  const out: H[] = [];
  const withdrawn = new Set<string>();
  while (sorted.length > 0) {
    const [first] = sorted as [H];
    const same = sorted.filter((one) => one.at === first.at && one.number === first.number);
    sorted.splice(0, same.length);
    const texts = same.filter(({ kind }) => kind === 'published');
    for (const act of same.filter(({ kind }) => kind !== 'published')) {
      if (!withdrawn.has(act.number)) out.push(...texts.splice(0));
      out.push(act);
      if (act.kind === 'withdrawn') withdrawn.add(act.number);
      else withdrawn.delete(act.number);
    }
    out.push(...texts);
  }
  return out;
}
