import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { toBase } from '@/domain/measure/convert';
import { readInputs } from '@/domain/worksheets/readInputs';
import { WORKSHEETS } from '@/domain/worksheets/registry';
import { ruleText, ruleUnit, ruleWords } from '@/domain/worksheets/ruleWords';
import { readRule, rulesOf, type RuleOfThumb } from '@/domain/worksheets/shopRules';
import type { Worksheet } from '@/domain/worksheets/worksheet';
import { between, relative } from '../../factories/measures';
import { FILLED, SAMPLE } from '../../factories/sampleWorksheet';

const SHEET = { name: 'sample', title: 'Sample', fields: SAMPLE } as unknown as Worksheet;
const rules = rulesOf([SHEET]);
const rule = (field: string): RuleOfThumb => rules.find((one) => one.field === field)!;

describe('the rules of thumb', () => {
  it('are the measures and numbers with something usual, and nothing else', () => {
    // A choice with a usual option is no number, and a column of a list is nobody's setting.
    expect(rules.map(({ name }) => name)).toEqual(['sample.deviation', 'sample.gap', 'sample.factor']);
    expect(rule('gap')).toEqual({
      name: 'sample.gap',
      worksheet: { name: 'sample', title: 'Sample' },
      field: 'gap',
      label: 'Gap allowed',
      hint: undefined,
      unit: 'mm',
      after: undefined,
      usual: 0.05,
      above: 0,
      least: undefined,
      most: undefined,
    });
    expect(rule('factor')).toMatchObject({ unit: null, usual: 0.2, above: 0, most: 1 });
  });

  it('of the worksheets there are have names of their own and usual values within their own bounds', () => {
    const all = rulesOf();
    expect(new Set(all.map(({ name }) => name)).size).toBe(all.length);
    for (const one of all) {
      expect(one.name).toMatch(/^[a-z-]+\.[a-zA-Z0-9]+$/);
      expect(readRule(one, one.usual), one.name).toEqual({ ok: true, value: one.usual });
      // Nobody can weigh a number that is not said to be a custom.
      expect(`${one.label} ${one.hint ?? ''}`, one.name).toMatch(/common practice/i);
    }
  });

  it('never stand in a column of a list, where no setting reaches', () => {
    for (const { name, fields } of WORKSHEETS)
      for (const [field, described] of Object.entries(fields))
        if (described.type === 'rows')
          for (const [column, cell] of Object.entries(described.columns))
            if (cell.type !== 'choice')
              expect('usual' in cell && cell.usual !== undefined, `${name}.${field}.${column}`).toBe(false);
  });
});

describe('a value for a rule', () => {
  it.each<[string, string | number, number]>([
    ['gap', 0.08, 0.08],
    ['gap', '0,08', 0.08],
    ['gap', '2 thou', 0.0508],
    ['gap', '80 µm', 0.08],
    ['deviation', '4 %', 4],
    ['deviation', 0, 0],
    ['factor', '.15', 0.15],
    ['factor', 1, 1],
  ])('%s %j is %d in its unit', (field, raw, value) => {
    expect(readRule(rule(field), raw)).toEqual({ ok: true, value });
  });

  it('without a unit is in that of the reader’s box, where it is a text', () => {
    expect(readRule(rule('gap'), '0.002', 'inch')).toEqual({ ok: true, value: 0.0508 });
    expect(readRule(rule('gap'), 0.002, 'inch')).toEqual({ ok: true, value: 0.002 });
  });

  it.each<[string, string | number, string]>([
    ['gap', 'wide', 'Gap allowed: "wide" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['gap', '1,250', 'Gap allowed: "1,250" can be read in two ways. Write 1250 or 1.250.'],
    ['gap', '0', 'Gap allowed must be more than zero.'],
    ['gap', '4 %', 'Gap allowed: % measures share, and here goes length, for example in mm.'],
    ['deviation', 51, 'Deviation allowed must be 50 % or less.'],
    ['deviation', -1, 'Deviation allowed cannot be less than zero.'],
    ['factor', '1.1', 'Nut factor must be 1 or less.'],
    ['factor', '0.2 mm', 'Nut factor: Write the number alone, without a unit.'],
    ['factor', NaN, 'Nut factor must be a number.'],
    ['gap', '', 'Gap allowed is missing.'],
  ])('%s %j is refused in the words of its box', (field, raw, message) => {
    expect(readRule(rule(field), raw)).toEqual({ ok: false, message });
  });

  it('is what the box itself would have read', () => {
    fc.assert(
      fc.property(between(1e-4, 10), (gap) => {
        const read = readRule(rule('gap'), `${gap}`);
        const { inputs } = readInputs(SAMPLE, { ...FILLED, gap: `${gap}` });
        const { inputs: byShop } = readInputs(SAMPLE, FILLED, { rules: { gap: read.ok ? read.value : NaN } });
        if (!inputs.ok || !byShop.ok) throw new Error('The sample cannot be read.');
        expect(relative(byShop.value.gap, inputs.value.gap)).toBeLessThan(1e-11);
        const base = toBase(gap, 'mm');
        expect(relative(byShop.value.gap, base.ok ? base.value : NaN)).toBeLessThan(1e-11);
      }),
    );
  });
});

describe('a value of a rule', () => {
  it('is read by people with its unit, in the units they use', () => {
    expect(ruleWords(rule('gap'), 0.08, 'metric')).toBe('0.08 mm');
    expect(ruleWords(rule('gap'), 0.08, 'inch')).toBe('0.0031 in');
    expect(ruleWords(rule('deviation'), 3, 'inch')).toBe('3 %');
    expect(ruleWords(rule('factor'), 0.2, 'metric')).toBe('0.2');
    expect(ruleWords({ unit: null, after: 'kg/m³' }, 745, 'inch')).toBe('745 kg/m³');
  });

  it('stands in its box in the unit of the box, fine enough to come back', () => {
    expect(ruleText(rule('gap'), 0.08, 'metric')).toBe('0.08');
    expect(ruleText(rule('gap'), 0.08, 'inch')).toBe('0.00315');
    expect(ruleText(rule('gap'), null, 'inch')).toBe('');
    expect([ruleUnit(rule('gap'), 'inch'), ruleUnit(rule('gap'), 'metric'), ruleUnit(rule('factor'), 'inch')]).toEqual([
      'in',
      'mm',
      undefined,
    ]);
    fc.assert(
      fc.property(between(1e-3, 10), fc.constantFrom('metric' as const, 'inch' as const), (gap, units) => {
        const read = readRule(rule('gap'), ruleText(rule('gap'), gap, units), units);
        expect(read.ok && relative(read.value, gap)).toBeLessThan(1e-3);
      }),
    );
  });
});
