import { expect, it } from 'vitest';
import { BLANK_PROCEDURE } from '@/domain/procedure/blank';
import { parseProcedure } from '@/domain/procedure/parse';
import { SAMPLE } from './sample';

const open = (source: string) => {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(parsed.errors.map(({ message }) => message).join());
  return parsed.toFillIn;
};

it('finds nothing in a sheet that is written', () => {
  expect(open(SAMPLE)).toEqual([]);
});

it('finds every marker of the empty sheet, each with its line and its place in the form', () => {
  const found = open(BLANK_PROCEDURE);
  expect(found.map(({ path }) => path)).toEqual([
    'summary',
    'engines',
    'cautions.0.hazard',
    'cautions.0.harm',
    'cautions.0.avoid',
    'intro',
    'steps.0.body',
    'steps.1.body',
    'steps.2.body',
    'steps.2.body',
  ]);
  const lines = BLANK_PROCEDURE.split('\n');
  for (const { line, path } of found)
    expect(lines[line - 1], path).toMatch(path === 'engines' ? /fill-in/ : /Fill in:/);
  expect(found[0]?.message).toBe('Still to fill in: what is done, and what comes out of it.');
});

it('finds a marker in a title, in bold, in a table and in a hold point', () => {
  const text = BLANK_PROCEDURE.replace('title="Do the work"', 'title="Fill in: what to do"').replace(
    /Fill in: one action[^\n]*/,
    '**Fill in: in bold.**\n\n| a | b |\n| - | - |\n| 1 | Fill in: a cell |\n\n<Hold>Fill in: who.</Hold>',
  );
  const messages = open(text).map(({ message }) => message);
  for (const what of ['what to do', 'in bold.', 'a cell', 'who.'])
    expect(messages).toContain(`Still to fill in: ${what}`);
});

it('lets a sentence pass that only speaks of filling in', () => {
  expect(open(SAMPLE.replace(/^summary: .*$/m, 'summary: Fill in the form, and fill the pan.'))).toEqual([]);
});
