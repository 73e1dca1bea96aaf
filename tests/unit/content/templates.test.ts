import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { ENGINE_TO_FILL_IN, FILL_IN } from '@/domain/procedure/fillIn';
import { parseProcedure } from '@/domain/procedure/parse';
import { SYSTEMS } from '@/domain/procedure/systems';
import { readDraft } from '@/domain/writing/readDraft';

const folder = 'content/templates';
const files = readdirSync(folder).filter((name) => name.endsWith('.mdx'));

const readings = new Map(files.map((file) => [file, parseProcedure(readFileSync(`${folder}/${file}`, 'utf8'))]));
function read(file: string) {
  const parsed = readings.get(file);
  if (!parsed?.ok) throw new Error(`${file}: ${parsed?.errors.map((e) => `${e.line}: ${e.message}`).join('; ')}`);
  return parsed;
}

it('has a template for every system', () => {
  const systems = new Set(files.map((file) => read(file).procedure.frontmatter.system));
  expect([...systems].sort()).toEqual(Object.keys(SYSTEMS).sort());
});

describe.each(files)('%s', (file) => {
  it('is in canonical form, fits the form, and has nothing to remark on but what is to fill in', () => {
    const { canonical, notices, toFillIn } = read(file);
    expect(canonical === readFileSync(`${folder}/${file}`, 'utf8')).toBe(true);
    expect(readDraft(canonical)).not.toBeNull();
    expect(notices).toEqual([]);
    expect(toFillIn.map(({ path }) => path)).toEqual(expect.arrayContaining(['engines', 'summary', 'intro']));
  });

  it('gives no number to work to, and no engine', () => {
    const { frontmatter } = read(file).procedure;
    const { torques, limits, timers, parts, engines } = frontmatter;
    expect([torques, limits, timers, parts]).toEqual([[], [], [], []]);
    expect(engines).toEqual([ENGINE_TO_FILL_IN]);
  });

  it('says its cautions whole: hazard, harm and how to avoid it, and stands each before a step', () => {
    const { frontmatter, steps } = read(file).procedure;
    const used = new Set(steps.flatMap(({ cautions }) => cautions));
    expect(frontmatter.cautions.length).toBeGreaterThanOrEqual(3);
    for (const { key, hazard, harm, avoid } of frontmatter.cautions) {
      expect(used).toContain(key);
      for (const text of [hazard, harm, avoid]) expect(text).not.toContain(FILL_IN);
      // ANSI Z535.6: the harm follows the hazard in one sentence, what to do is a sentence of its own.
      expect(hazard).toMatch(/^[A-Z].*[^.]$/);
      expect(harm).toMatch(/^[a-z].*[^.]$/);
      expect(avoid).toMatch(/^[A-Z].*\.$/);
    }
  });

  it('lays out first, makes safe second, holds at least once, and leaves each kind of step to its author', () => {
    const { procedure, rendered } = read(file);
    expect(procedure.steps.slice(0, 2).map(({ id }) => id)).toEqual(['lay-out', 'make-safe']);
    expect(procedure.steps.length).toBeGreaterThanOrEqual(6);
    expect(rendered.steps.flatMap(({ holds }) => holds).length).toBeGreaterThanOrEqual(1);
    expect(procedure.steps[1]?.cautions.length).toBeGreaterThanOrEqual(1);
  });
});
