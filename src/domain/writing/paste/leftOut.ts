/** What a paste did not bring in, to be told under the field. */
export interface LeftOut {
  /** The words that describe each picture; empty where it had none. */
  pictures: string[];
  /** Words of links that may not stand in a sheet; the words themselves came in. */
  links: string[];
  /** Words that were struck through. */
  struck: string[];
  /** Letters and figures of formulas. */
  formulas: string[];
  /** Words that stood between the points of a list and in none of them. */
  loose: string[];
  /** Keys of cautions, which stand ahead of the step and not among its words. */
  cautions: string[];
}

export const nothingLeftOut = (): LeftOut => ({
  pictures: [],
  links: [],
  struck: [],
  formulas: [],
  loose: [],
  cautions: [],
});

const short = (words: string) => (words.length > 60 ? `${words.slice(0, 57)}…` : words);
const named = (words: readonly string[]) => {
  const known = words.filter(Boolean).map((one) => `“${short(one)}”`);
  return known.length
    ? `: ${known.slice(0, 4).join(', ')}${known.length > 4 ? ` and ${known.length - 4} more` : ''}`
    : '';
};
const were = (n: number) => (n === 1 ? 'was' : 'were');

/** What was left out, in whole sentences. */
export function leftOutWords({ pictures, links, struck, formulas, loose, cautions }: LeftOut): string[] {
  const p = pictures.length;
  const l = links.length;
  const s = struck.length;
  const f = formulas.length;
  const o = loose.length;
  const c = cautions.length;
  return [
    ...(p
      ? [
          `${p} picture${p === 1 ? '' : 's'} ${were(p)} left out${named(pictures)}. Put drawings in with the button Drawing.`,
        ]
      : []),
    ...(l
      ? [
          `${l} link${l === 1 ? '' : 's'} ${were(l)} left out, the words stayed${named(links)}. Links go to https:// or to a path of this book.`,
        ]
      : []),
    ...(s
      ? [`${s} passage${s === 1 ? '' : 's'} that ${were(s)} struck through ${were(s)} left out${named(struck)}.`]
      : []),
    ...(f ? [`${f} formula${f === 1 ? '' : 's'} ${were(f)} left out${named(formulas)}. Write it in one line.`] : []),
    ...(o ? [`${o} passage${o === 1 ? '' : 's'} between points of a list ${were(o)} left out${named(loose)}.`] : []),
    ...(c
      ? [
          `${c} caution${c === 1 ? '' : 's'} ${were(c)} left out${named(cautions)}. Put cautions ahead of the step with the button Caution.`,
        ]
      : []),
  ];
}
