/**
 * Threads to the inch of the unified coarse and fine series, by nominal size: [coarse, fine], null where the series
 * has none. Sizes over one inch are written as one fraction, as the schema's thread does ("9/8-7 UNC" is 1 1/8 in).
 * Source: ASME B1.1, as quoted in secondary tables of UNC and UNF threads.
 */
export const UNIFIED_SERIES: Readonly<Record<string, readonly [coarse: number | null, fine: number | null]>> = {
  '#0': [null, 80],
  '#1': [64, 72],
  '#2': [56, 64],
  '#3': [48, 56],
  '#4': [40, 48],
  '#5': [40, 44],
  '#6': [32, 40],
  '#8': [32, 36],
  '#10': [24, 32],
  '#12': [24, 28],
  '1/4': [20, 28],
  '5/16': [18, 24],
  '3/8': [16, 24],
  '7/16': [14, 20],
  '1/2': [13, 20],
  '9/16': [12, 18],
  '5/8': [11, 18],
  '3/4': [10, 16],
  '7/8': [9, 14],
  '1': [8, 12],
  '9/8': [7, 12],
  '5/4': [7, 12],
  '11/8': [6, 12],
  '3/2': [6, 12],
};

/**
 * Nominal diameter of a size in inches: a whole number, a fraction, or `#n`, which is 0.060 + 0.013·n
 * (ASME B1.1, from memory; agrees with the quoted diameters of #0 to #12).
 */
export function inchesOf(size: string): number {
  if (size.startsWith('#')) return (60 + 13 * Number(size.slice(1))) / 1000;
  const [over = '', under = '1'] = size.split('/');
  return Number(over) / Number(under);
}
