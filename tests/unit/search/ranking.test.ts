import { describe, expect, it } from 'vitest';
import { createSearch } from '@/domain/search/engine';
import { shippedBook } from '../../factories/shippedBook';

const book = shippedBook();
const search = createSearch(book);
const first = (query: string): string | undefined => search.query(query).hits[0]?.number;

/** What somebody types at the bench, and the sheet they mean. Judged by hand; common practice, no source. */
const TABLE: [query: string, number: string][] = [
  // By the book's own words
  ['valve cover', 'P-0142'],
  ['reseal valve cover', 'P-0142'],
  ['thermostat', 'P-0137'],
  ['water pump', 'P-0139'],
  ['oil pump', 'P-0158'],
  ['timing chain', 'P-0121'],
  ['flywheel', 'P-0160'],
  ['starter', 'P-0163'],
  ['glow plugs', 'P-0171'],
  ['ring gap', 'P-0150'],
  ['first start after a rebuild', 'P-0190'],
  ['how do I measure the bores', 'P-0154'],
  // By other names
  ['rocker cover', 'P-0142'],
  ['cam cover', 'P-0142'],
  ['sump', 'P-0108'],
  ['oil pan gasket', 'P-0108'],
  ['big end', 'P-0152'],
  ['rod bearing clearance', 'P-0152'],
  ['tappet clearance', 'P-0118'],
  ['valve clearance', 'P-0118'],
  ['PCV', 'P-0101'],
  ['inlet manifold', 'P-0115'],
  ['head gasket', 'P-0124'],
  ['cranking motor', 'P-0163'],
  ['heater plug', 'P-0171'],
  ['leakdown', 'P-0156'],
  ['sea water pump', 'P-0181'],
  ['intercooler stack', 'P-0183'],
  ['antifreeze by-pass pipe', 'P-0111'],
  ['pressure plate', 'P-0160'],
  ['leak-off diesel injectors', 'P-0173'],
  ['ovality', 'P-0154'],
  ['injector cleaning', 'P-0104'],
  // Mistyped
  ['vlave cover', 'P-0142'],
  ['timming chain', 'P-0121'],
  ['timing chian', 'P-0121'],
  ['thermastat', 'P-0137'],
  ['injecter clean', 'P-0104'],
  ['impellor', 'P-0181'],
  ['clucth', 'P-0160'],
  ['compresion', 'P-0156'],
  ['throtle', 'P-0113'],
  // Not finished
  ['rocker cov', 'P-0142'],
  ['thermo', 'P-0137'],
  ['piston ri', 'P-0150'],
  ['heat exch', 'P-0183'],
  // By a value
  ['89 lbf in cover', 'P-0142'],
  ['89 lbf·in valve cover', 'P-0142'],
  ['7.4 ft lb cam cover', 'P-0142'],
  ['10nm M6 crank seal', 'P-0131'],
  ['44 ft-lb', 'P-0160'],
  ['60 Nm', 'P-0160'],
  ['8 thou lash', 'P-0118'],
  ['0,20 mm intake', 'P-0118'],
  ['88 C', 'P-0137'],
  ['150 nm crank seal', 'P-0131'],
  ['40 Nm head bolt', 'P-0124'],
  ['350 kPa injectors', 'P-0104'],
  // By a number, of a sheet or of a part
  ['P-0142', 'P-0142'],
  ['p142', 'P-0142'],
  ['0142', 'P-0142'],
  ['TN-4210', 'P-0131'],
  // With an engine
  ['t18f water pump', 'P-0139'],
  ['b3 impeller', 'P-0181'],
  ['t24d injector', 'P-0173'],
];

describe('the first hit', () => {
  it.each(TABLE)('%s', (query, number) => {
    expect(first(query)).toBe(number);
  });

  it('stays the first while the last words are being typed', () => {
    for (const [query, number] of [
      ['rocker cover', 'P-0142'],
      ['timing chain', 'P-0121'],
      ['heat exchanger', 'P-0183'],
    ] as const)
      for (let length = query.indexOf(' ') + 3; length <= query.length; length += 1)
        expect(first(query.slice(0, length)), query.slice(0, length)).toBe(number);
  });
});

describe('what is said with a hit', () => {
  it('names the value that was asked for and what it is for', () => {
    const { hits, readAs } = search.query('89 lbf in rocker cover');
    expect(readAs.quantities).toEqual(['10 N·m']);
    expect(readAs.synonyms[0]).toEqual(expect.arrayContaining(['valve cover', 'rocker cover', 'cam cover']));
    const value = hits[0]?.matched.find((one) => one.field === 'torque');
    expect(value?.text).toMatch(/^10 N·m cover bolt, M6×1\.0, 11 places, step \d+$/);
    expect(value?.marks[0]).toEqual([0, '10 N·m'.length]);
    expect(value?.step).toBeGreaterThan(0);
  });

  it('speaks the reader’s units', () => {
    const { hits, readAs } = search.query('10 Nm cam cover', undefined, { units: 'inch' });
    expect(readAs.quantities).toEqual(['89 lbf·in']);
    expect(hits[0]?.matched.find((one) => one.field === 'torque')?.text).toMatch(/^89 lbf·in cover bolt/);
  });

  it('marks the trade name that stands in the title', () => {
    const title = search.query('cam cover').hits[0]?.matched.find((one) => one.field === 'title');
    const [start = 0, end = 0] = title?.marks[0] ?? [];
    expect(title?.text.slice(start, end)).toBe('valve cover');
  });

  it('gives marks that lie inside the text, in order, and never overlap', () => {
    for (const [query] of TABLE)
      for (const { matched } of search.query(query).hits)
        for (const { text, marks } of matched)
          marks.reduce((before, [start, end]) => {
            expect(start).toBeGreaterThanOrEqual(before);
            expect(end).toBeGreaterThan(start);
            expect(end).toBeLessThanOrEqual(text.length);
            return end;
          }, 0);
  });

  it('says when nothing holds all of the query', () => {
    expect(search.query('valve cover').near).toBe(false);
    expect(search.query('valve cover zeppelin')).toMatchObject({ near: true });
    expect(search.query('valve cover zeppelin').hits[0]?.number).toBe('P-0142');
    expect(search.query('zeppelin').total).toBe(0);
  });

  it('does not take two words on either side of a comma for one name', () => {
    // P-0181 says "check cam, cover and shaft".
    expect(search.query('cam cover').hits.map((hit) => hit.number)).not.toContain('P-0181');
  });
});

describe('filters', () => {
  const all = search.query('');

  it('lists the whole book, in its order, for an empty query', () => {
    expect(all.total).toBe(book.documents.length);
    expect(search.query('', undefined, { limit: 100 }).hits.map((hit) => hit.number)).toEqual(
      book.documents.map((document) => document.number),
    );
  });

  it('counts what each choice would show', () => {
    for (const [engine, count] of Object.entries(all.facets.engine))
      expect(search.query('', { engine: [engine], system: [], fit: [] }).total).toBe(count);
    for (const [fit, count] of Object.entries(all.facets.fit))
      expect(search.query('', { engine: [], system: [], fit: [fit as 'apprentice'] }).total).toBe(count);
  });

  it('keeps the other choices of a filter countable', () => {
    const narrowed = search.query('', { engine: ['tarn-t24d'], system: [], fit: [] });
    expect(narrowed.facets.engine).toEqual(all.facets.engine);
    expect(narrowed.hits.every((hit) => hit.engines.includes('tarn-t24d'))).toBe(true);
  });
});
