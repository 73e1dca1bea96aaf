/** What a paste did not bring in, to be told under the field. */
export interface LeftOut {
  /** The words that describe each picture; empty where it had none. */
  pictures: string[];
  /** Words of links that may not stand in a sheet; the words themselves came in. */
  links: string[];
  /** Words that were struck through. */
  struck: string[];
}

export const nothingLeftOut = (): LeftOut => ({ pictures: [], links: [], struck: [] });

const short = (words: string) => (words.length > 60 ? `${words.slice(0, 57)}…` : words);
const named = (words: readonly string[]) => {
  const known = words.filter(Boolean).map((one) => `“${short(one)}”`);
  return known.length
    ? `: ${known.slice(0, 4).join(', ')}${known.length > 4 ? ` and ${known.length - 4} more` : ''}`
    : '';
};
const were = (n: number) => (n === 1 ? 'was' : 'were');

/** What was left out, in whole sentences. */
export function leftOutWords({ pictures, links, struck }: LeftOut): string[] {
  const p = pictures.length;
  const l = links.length;
  const s = struck.length;
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
  ];
}
