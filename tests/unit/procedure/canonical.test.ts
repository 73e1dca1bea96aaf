import { setImmediate } from 'node:timers/promises';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { toSource } from '@/domain/procedure/canonical';
import { parseProcedure } from '@/domain/procedure/parse';
import { typedProcedure, withBody } from './arbitraries';

/** Raise it for a long hunt: FUZZ_RUNS=2000. */
const runs = Number(process.env['FUZZ_RUNS'] ?? 40);

describe('the canonical text', () => {
  it('holds every generated procedure: its head unchanged, its words rendered the same, itself a fixed point', async () => {
    let refused = 0;
    await fc.assert(
      fc.asyncProperty(typedProcedure, async (procedure) => {
        await setImmediate();
        const first = parseProcedure(toSource(procedure));
        if (!first.ok) {
          // Only a passage that cannot be written back, or words that a line of = turned into a heading.
          expect(first.errors.map((e) => e.message).join('\n')).toMatch(/cannot be kept|Headings are not used/);
          refused += 1;
          return;
        }
        expect(first.procedure.frontmatter).toEqual(procedure.frontmatter);
        expect(first.procedure.steps.map(({ id, title, cautions }) => ({ id, title, cautions }))).toEqual(
          procedure.steps.map(({ id, title, cautions }) => ({ id, title, cautions })),
        );
        const second = parseProcedure(first.canonical);
        if (!second.ok) throw new Error(JSON.stringify(second.errors));
        expect(second.canonical).toBe(first.canonical);
        expect(second.procedure).toEqual(first.procedure);
        expect(second.rendered).toEqual(first.rendered);
        expect(toSource(first.procedure)).toBe(first.canonical);
      }),
      { numRuns: runs },
    );
    expect(refused).toBeLessThanOrEqual(Math.ceil(runs / 20));
  }, 60_000);
});
const SIGNS = ['*', '**', '_', '`', '~~', '|', '\\', '[', ']', '(', ')', '<', '>', '&', '#', '-', '+', '1.', '\n', '\n\n', '\n> ', '\n- ', '\n  ', '\n    ', '\n1. ', ' ', '  ', '&nbsp;', '&#x20;', '&#10;', '&amp;', '!', ':', '"', '{', '}', '=', '---', '| a | b |\n| - | - |\n', '<Torque of="bolt" />', '<Limit of="gap" />', '<Part of="gasket" />', '<Hold>', '</Hold>', '<Figure of="under" />', '<Caution of="hot" />', '</Step>', '<Step id="x" title="y">', 'a', 'b', 'word', '10', 'https://a.example', 'www.a.example', 'a@b.example', '[x](/y)', '[x](<y> "t")', '\t', '\u00a0', 'é', '**a', 'b**', '*a*b', '\\\n']; // prettier-ignore

describe('any text at all', () => {
  it('is answered with a settled text or with errors at a place, and never with an exception', async () => {
    let kept = 0;
    await fc.assert(
      fc.asyncProperty(fc.array(fc.constantFrom(...SIGNS), { maxLength: 24 }), async (parts) => {
        await setImmediate();
        const source = withBody(parts.join(''));
        const parsed = parseProcedure(source);
        if (!parsed.ok) {
          expect(parsed.errors.length).toBeGreaterThan(0);
          for (const error of parsed.errors) {
            expect(error.line).toBeGreaterThan(0);
            expect(error.column).toBeGreaterThan(0);
            expect(error.message).toMatch(/^["\p{Lu}<][^\n]*[.?)>]$/u);
          }
          return;
        }
        kept += 1;
        const again = parseProcedure(parsed.canonical);
        if (!again.ok) throw new Error(JSON.stringify(again.errors));
        expect(again.canonical).toBe(parsed.canonical);
        expect(again.rendered).toEqual(parsed.rendered);
      }),
      { numRuns: runs * 8 },
    );
    expect(kept).toBeGreaterThan(runs / 10);
  }, 60_000);
});
