import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { COMPONENTS } from '@/domain/procedure/components';
import { ENTRY_FIELDS, HEAD_FIELDS } from '@/domain/procedure/fields';
import { parseProcedure } from '@/domain/procedure/parse';
import { CONDITIONS, FrontmatterFields, KEYED_LISTS } from '@/domain/procedure/schema';
import { WORKSHEET_KINDS } from '@/domain/procedure/worksheets';
import { bandsOf } from '@/domain/procedure/bindings';
import { ENUMERATED } from '@/domain/writing/source/headOffers';
import { looseHead } from '@/domain/writing/source/looseHead';
import { offersAt } from '@/domain/writing/source/offersAt';
import { readDraft } from '@/domain/writing/readDraft';

const sheet = readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8');
const known = {
  engines: [
    { key: 'tarn-t18f', name: 'Tarn T18F' },
    { key: 'tarn-t24d', name: 'Tarn T24D' },
  ],
  drawings: [{ file: 'cover-underside.svg', caption: 'Underside' }],
};
/** Offers where `|` stands in the text. */
function at(marked: string) {
  const caret = marked.indexOf('|');
  const text = marked.replace('|', '');
  const found = offersAt(text, caret, known);
  return (
    found && {
      typed: text.slice(found.from, caret),
      labels: found.offers.map(({ label }) => label),
      offers: found.offers,
    }
  );
}
const inHead = (line: string, before = '') => at(`---\ntitle: Seal\n${before}${line}\n---\n\nWords.\n`);
const HEAD = `---
title: Seal
torques:
  - key: bolt
    name: Cover bolt
    nm: 10
    passes: [5, 7.5]
  - key: "nut"
    name: Nut
    nm: 22
limits:
  - key: gap
    name: Gap
    quantity: length
    unit: mm
    min: 0.1
    max: 0.2
timers:
  - key: soak
    name: Soak
    minutes: 5
supplies:
  - key: silicone
    name: Silicone sealant
    skinOver: 10
cautions:
  - key: hot-oil
    signal: WARNING
    hazard: Hot oil
sources:
  - key: demo
    title: Values
---
`;
const inBody = (line: string) => at(`${HEAD}\n<Step id="a" title="Do it">\n${line}\n</Step>\n`);

describe('what can stand in the front matter', () => {
  it('offers the fields that are not there yet', () => {
    expect(inHead('su|')).toMatchObject({ typed: 'su' });
    expect(inHead('|')?.labels).toEqual(Object.keys(HEAD_FIELDS).filter((name) => name !== 'title'));
    const offers = inHead('|')?.offers;
    expect(offers?.find(({ label }) => label === 'minutes')).toEqual({
      label: 'minutes',
      detail: 'bench time',
      insert: 'minutes: ',
    });
    expect(offers?.find(({ label }) => label === 'parts')?.insert).toBe('parts:\n  - key: ');
  });

  it.each(KEYED_LISTS)('offers the fields of an entry of %s that it has not yet', (list) => {
    const names = Object.keys(ENTRY_FIELDS[list]);
    expect(inHead('  - |', `${list}:\n`)?.labels).toEqual(names);
    const [key, ...rest] = names;
    expect(inHead('    |', `${list}:\n  - ${key}: x\n`)?.labels).toEqual(rest);
  });

  it('offers the words that a field may hold, for every enumerated field of the schema', () => {
    const unwrap = (type: z.ZodTypeAny): z.ZodTypeAny =>
      type instanceof z.ZodOptional || type instanceof z.ZodDefault
        ? unwrap(type._def.innerType)
        : type instanceof z.ZodEffects
          ? unwrap(type._def.schema)
          : type;
    const enumerated: Record<string, readonly string[]> = {};
    for (const [name, type] of Object.entries(FrontmatterFields.shape)) {
      const field = unwrap(type);
      if (field instanceof z.ZodEnum) enumerated[name] = field.options;
      if (field instanceof z.ZodBoolean) enumerated[name] = ['true', 'false'];
      const entry = field instanceof z.ZodArray ? unwrap(field.element) : null;
      if (entry instanceof z.ZodObject)
        for (const [inner, one] of Object.entries(entry.shape as z.ZodRawShape)) {
          const kind = unwrap(one);
          if (kind instanceof z.ZodEnum) enumerated[`${name}.${inner}`] = kind.options;
        }
    }
    expect(Object.keys(enumerated).length).toBeGreaterThan(7);
    expect(ENUMERATED).toEqual(enumerated);
    for (const [path, words] of Object.entries(enumerated)) {
      const [list, field] = path.split('.');
      const found = field ? inHead(`    ${field}: |`, `${list}:\n  - key: x\n`) : inHead(`${path}: |`);
      expect(found?.labels).toEqual(words);
    }
    expect(inHead('    condition: thr|', 'torques:\n  - key: x\n')).toMatchObject({ typed: 'thr', labels: CONDITIONS });
  });

  it('offers units of the quantity, sources, engines and drawings', () => {
    expect(inHead('    unit: |', 'limits:\n  - key: x\n    quantity: length\n')?.labels).toContain('mm');
    expect(inHead('    unit: |\n    quantity: pressure', 'limits:\n  - key: x\n')?.labels).toContain('kPa');
    expect(inHead('    unit: |', 'limits:\n  - key: x\n    quantity: nonsense\n')).toBeNull();
    const sources = 'sources:\n  - key: demo\n    title: Values\n    kind: demonstration\ntorques:\n  - key: x\n';
    expect(inHead('    source: |', sources)?.offers).toEqual([{ label: 'demo', detail: 'Values, demonstration' }]);
    expect(inHead('  - tarn-t2|', 'engines:\n  - tarn-t18f\n')).toMatchObject({
      typed: 'tarn-t2',
      labels: ['tarn-t24d'],
    });
    expect(inHead('    file: |', 'figures:\n  - key: x\n')?.labels).toEqual(['cover-underside.svg']);
  });

  it('offers nothing in free words, on the fences, nor after a value', () => {
    expect(inHead('summary: A |')).toBeNull();
    expect(at('---|\ntitle: x\n---\n')).toBeNull();
    expect(at('---\ntitle: x\n---|\n')).toBeNull();
    expect(inHead('    name: |', 'torques:\n  - key: x\n')).toBeNull();
    expect(at('Words |')).toBeNull();
  });

  it('goes on while the end of the front matter is not written yet', () => {
    expect(at('---\ntitle: x\nski|')).toMatchObject({ typed: 'ski' });
    expect(at('---\ntitle: x\nskill: |')?.labels).toContain('senior');
  });
});

describe('what can stand in a component', () => {
  it('offers the closed set, ready to be filled in', () => {
    const found = inBody('Tighten <|');
    expect(found?.labels).toEqual(Object.keys(COMPONENTS));
    expect(found?.offers.find(({ label }) => label === 'Torque')).toEqual({
      label: 'Torque',
      detail: 'among words',
      insert: 'Torque of="" />',
      caret: 11,
    });
    expect(found?.offers.find(({ label }) => label === 'Hold')).toMatchObject({ insert: 'Hold></Hold>', caret: 5 });
    expect(found?.offers.find(({ label }) => label === 'Step')).toMatchObject({
      insert: 'Step id="" title="">\n\n</Step>',
      caret: 9,
    });
    expect(inBody('Tighten <Tor|')).toMatchObject({ typed: 'Tor' });
  });

  it.each([
    ['<Torque of="|" />', ['bolt', 'nut']],
    ['<Torque of="bolt" pass="|" />', ['1', '2']],
    ['<Torque pass="|" of="bolt" />', ['1', '2']],
    ['<Limit of="|" />', ['gap']],
    ['<Timer of="|" />', ['soak', 'silicone']],
    ['<Timer of="|" stage="cure" />', []],
    ['<Timer of="|" stage="skin-over" />', ['silicone']],
    ['<Timer of="silicone" stage="|" />', ['skin-over']],
    ['<Caution of="|" />', ['hot-oil']],
    ['<Worksheet kind="|" />', [...WORKSHEET_KINDS]],
    ['<Worksheet kind="readings" of="|" />', ['gap']],
    ['<Torque |', ['of', 'pass']],
    ['<Torque of="bolt" |', ['pass']],
    ['<Hold |', []],
    ['<Nothing of="|"', []],
  ])('%s', (line, labels) => expect(inBody(line)?.labels ?? []).toEqual(labels));

  it('says what a key stands for', () => {
    expect(inBody('<Torque of="|')?.offers[0]).toEqual({ label: 'bolt', detail: 'Cover bolt, 10 N·m' });
    expect(inBody('<Limit of="|')?.offers[0]).toEqual({ label: 'gap', detail: 'Gap, 0.1 to 0.2 mm' });
    expect(inBody('<Torque of="bolt" pass="|')?.offers[1]).toEqual({ label: '2', detail: '7.5 N·m' });
    expect(inBody('<Caution of="|')?.offers[0]).toEqual({ label: 'hot-oil', detail: 'Hot oil, WARNING' });
  });

  it('offers the fields of a worksheet, and limits behind them', () => {
    expect(bandsOf('bearing-clearance').length).toBeGreaterThan(0);
    const bands = bandsOf('bearing-clearance').map((name) => `${name}:`);
    expect(inBody('<Worksheet kind="bearing-clearance" of="gap |"')).toMatchObject({
      typed: '',
      labels: ['gap', ...bands],
    });
    expect(inBody(`<Worksheet kind="bearing-clearance" of="${bands[0]}g|"`)).toMatchObject({
      typed: 'g',
      labels: ['gap'],
    });
  });
});

describe('the front matter by its bare lines', () => {
  it.each(['p-0142-valve-cover-reseal.mdx', 'p-0124-cylinder-head.mdx', 'p-0154-bore-measurement.mdx'])(
    'finds the keys of %s that the parser finds',
    (file) => {
      const text = readFileSync(`content/procedures/${file}`, 'utf8');
      const parsed = parseProcedure(text);
      if (!parsed.ok) throw new Error('unreadable');
      const loose = looseHead(text);
      for (const list of KEYED_LISTS)
        expect(loose.lists[list].map(({ key }) => key)).toEqual(
          parsed.procedure.frontmatter[list].map(({ key }) => key),
        );
      expect(loose.engines).toEqual(parsed.procedure.frontmatter.engines);
      expect(loose.lists.torques.map(({ name }) => name)).toEqual(readDraft(text)?.torques.map(({ name }) => name));
    },
  );

  it('never fails, whatever the text and wherever the caret', () => {
    const piece = fc.constantFrom(
      '---\n',
      'title: ',
      'torques:\n',
      '  - key: ',
      '    ',
      '<',
      '<Torque of="',
      '" ',
      '/>',
      '\n',
      'x',
      ':',
      '- ',
      '"',
      '__proto__: ',
      'constructor',
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 40 }), fc.nat(200), (pieces, place) => {
        const text = pieces.join('');
        const caret = Math.min(place, text.length);
        const found = offersAt(text, caret, known);
        if (!found) return;
        expect(found.from).toBeGreaterThanOrEqual(0);
        expect(found.from).toBeLessThanOrEqual(caret);
        expect(found.offers.length).toBeGreaterThan(0);
      }),
      { numRuns: 500 },
    );
  });

  it('is quick on a long sheet', () => {
    const long = sheet + 'Words of a long step. '.repeat(2000);
    const start = performance.now();
    for (let i = 0; i < 20; i += 1) offersAt(`${long}<Torque of="`, long.length + 12, known);
    expect((performance.now() - start) / 20).toBeLessThan(20);
  });
});
