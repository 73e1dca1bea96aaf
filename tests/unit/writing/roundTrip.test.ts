import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { procedureOf } from '@/domain/writing/procedureOf';
import { readDraft, sourceOf } from '@/domain/writing/readDraft';

const folder = 'content/procedures';
const files = readdirSync(folder).filter((name) => name.endsWith('.mdx'));
const textOf = (name: string) => readFileSync(`${folder}/${name}`, 'utf8');
const valveCover = textOf('p-0142-valve-cover-reseal.mdx');

describe('form, procedure and text', () => {
  it.each(files)('%s comes back from the form to the letter', (name) => {
    const text = textOf(name);
    const draft = readDraft(text);
    expect(draft).not.toBeNull();
    expect(sourceOf(draft!)).toBe(text);
    const parsed = parseProcedure(text);
    expect(parsed.ok && procedureOf(draft!)).toEqual(
      parsed.ok && { ...parsed.procedure, frontmatter: expect.anything() },
    );
  });

  it('keeps a number that cannot be read as it was typed', () => {
    const draft = readDraft(valveCover)!;
    draft.torques[0]!['nm'] = '10 or so';
    const text = sourceOf(draft);
    expect(text).toContain('nm: 10 or so');
    expect(readDraft(text)?.torques[0]?.['nm']).toBe('10 or so');
  });

  it('reads a decimal comma', () => {
    const draft = readDraft(valveCover)!;
    draft.torques[0]!['nm'] = '10,5';
    draft.torques[0]!['passes'] = '5,25;';
    const { torques } = procedureOf(draft).frontmatter;
    expect(torques[0]).toMatchObject({ nm: 10.5, passes: [5.25] });
  });

  it('keeps a draft with empty fields a form', () => {
    const draft = readDraft(valveCover)!;
    draft.title = '';
    draft.torques[0]!['nm'] = '';
    draft.steps.push({ id: 'new-step', title: '', cautions: [], body: '' });
    const again = readDraft(sourceOf(draft));
    expect(again?.steps.at(-1)).toEqual({ id: 'new-step', title: '', cautions: [], body: '' });
    expect(again?.title).toBe('');
  });

  it('does not take a text it could not give back', () => {
    expect(readDraft('no front matter')).toBeNull();
    expect(readDraft(valveCover.replace('title: Reseal', 'titel: Reseal'))).toBeNull();
    expect(readDraft(valveCover.replace('nm: 10\n', 'nm: [10, 12]\n'))).toBeNull();
    expect(readDraft(valveCover.replace('system: sealing', 'system: {a: 1}'))).toBeNull();
    expect(readDraft(valveCover.replace('</Step>', ''))).toBeNull();
  });

  it('brings back whatever was typed, however odd', () => {
    const anything = fc.string({ unit: 'grapheme', maxLength: 60 });
    fc.assert(
      fc.property(anything, anything, anything, (title, hazard, note) => {
        const draft = readDraft(valveCover)!;
        draft.steps[0]!.title = title.replace(/[\r\n]/g, ' ');
        draft.cautions[0]!['hazard'] = hazard;
        draft.torques[0]!['note'] = note;
        const text = sourceOf(draft);
        const again = readDraft(text);
        expect(again && sourceOf(again)).toBe(text);
      }),
      { numRuns: 60 },
    );
  });
});
