import { describe, expect, it } from 'vitest';
import { boxesOf, nest, ownTexts, rowsFilled } from '@/domain/worksheets/typedIn';
import { SAMPLE } from '../../factories/sampleWorksheet';

const own = (...texts: [string, string][]) => ownTexts(SAMPLE, texts);

describe('the boxes of a field', () => {
  it('are one for a measure, two for a limit, one for each place of a row', () => {
    expect(boxesOf('depth', SAMPLE.depth, 3)).toEqual(['depth']);
    expect(boxesOf('limit', SAMPLE.limit, 3)).toEqual(['limit.min', 'limit.max']);
    expect(boxesOf('injectors', SAMPLE.injectors, 2)).toEqual(
      [0, 1].flatMap((i) => ['before', 'after', 'spray', 'leak'].map((column) => `injectors.${i}.${column}`)),
    );
    expect(boxesOf('injectors', SAMPLE.injectors, 0)).toEqual([]);
  });
});

describe('flat texts', () => {
  it('become the nested inputs that they stand for', () => {
    expect(
      nest(SAMPLE, {
        depth: '12',
        'limit.max': '0.05',
        'injectors.0.before': '250',
        'injectors.2.after': '255',
        'injectors.2.leak': 'none',
        unknown: 'x',
        'limit.middle': 'x',
        'depth.deeper': 'x',
      }),
    ).toEqual({
      ...Object.fromEntries(Object.keys(SAMPLE).map((name) => [name, undefined])),
      depth: '12',
      limit: { min: undefined, max: '0.05' },
      warmth: { min: undefined, max: undefined },
      injectors: [
        { before: '250', after: undefined, spray: undefined, leak: undefined },
        { before: undefined, after: undefined, spray: undefined, leak: undefined },
        { before: undefined, after: '255', spray: undefined, leak: 'none' },
      ],
    });
  });

  it('count rows up to the last that holds something, and no more than the field takes', () => {
    const filled = (...paths: string[]) =>
      rowsFilled('injectors', SAMPLE.injectors, Object.fromEntries(paths.map((path) => [path, 'x'])));
    expect(filled()).toBe(0);
    expect(filled('injectors.0.before', 'injectors.3.leak')).toBe(4);
    expect(filled('injectors.900.before')).toBe(6);
    expect(rowsFilled('injectors', SAMPLE.injectors, { 'injectors.3.before': '  ' })).toBe(0);
    expect(
      filled(
        'injectors.0.constructor',
        'injectors.0.__proto__',
        'injectors..before',
        'injectors.1e0.before',
        'injectors.-1.before',
        'injectors.01.before',
        'injectors.1',
        'injectors',
        'other.3.before',
      ),
    ).toBe(0);
  });

  it('do not reach what an object inherits', () => {
    const nested = nest({ constructor: SAMPLE.depth, toString: SAMPLE.heat }, {});
    expect(nested).toEqual({ constructor: undefined, toString: undefined });
  });
});

describe('an address', () => {
  it('brings only the texts of the boxes there are', () => {
    const texts: [string, string][] = [
      ['depth', ' 12 mm '],
      ['limit.min', '0.02'],
      ['injectors.0.before', '250'],
      ['injectors.5.spray', 'good'],
    ];
    expect(own(...texts)).toEqual(Object.fromEntries(texts));
    for (const path of [
      '',
      '.',
      'unknown',
      'depth.min',
      'depth.0.before',
      'limit',
      'limit.middle',
      'limit.min.0',
      'injectors',
      'injectors.0',
      'injectors.6.before',
      'injectors.01.before',
      'injectors.-1.before',
      'injectors.1e0.before',
      'injectors.٣.before',
      'injectors.0.before.x',
      'injectors.0.constructor',
      '__proto__',
      '__proto__.polluted',
      'constructor',
      'constructor.prototype.polluted',
      'hasOwnProperty',
      'injectors.__proto__.before',
      'injectors.0.__proto__',
      'limit.__proto__',
    ])
      expect(own([path, '1']), path).toEqual({});
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  it('leaves out what is empty, cuts what no box would take, and lets the last of two stand', () => {
    expect(own(['depth', '   '])).toEqual({});
    expect(own(['depth', '9'.repeat(5000)])['depth']).toHaveLength(60);
    expect(own(['depth', '1'], ['depth', '2'])).toEqual({ depth: '2' });
  });

  it('with ten thousand parameters is read at once, and only what belongs is kept', () => {
    const texts = Array.from({ length: 10_000 }, (_, i): [string, string] => [`injectors.${i}.before`, String(i)]);
    const from = performance.now();
    const kept = own(...texts, ...texts, ['depth', '1']);
    nest(SAMPLE, kept);
    expect(performance.now() - from).toBeLessThan(250);
    expect(Object.keys(kept)).toEqual([...Array.from({ length: 6 }, (_, i) => `injectors.${i}.before`), 'depth']);
  });

  it('that was made of what was kept brings it again', () => {
    const kept = own(
      ['depth', '14 thou & more=1#½'],
      ['limit.max', '+0.05'],
      ['engine', 'a b+c%20'],
      ['injectors.1.before', '252'],
    );
    expect(ownTexts(SAMPLE, new URLSearchParams(Object.entries(kept)))).toEqual(kept);
  });
});
