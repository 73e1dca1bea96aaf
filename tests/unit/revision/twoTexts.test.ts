import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { compareProcedures } from '@/domain/revision/compare';
import { changesInWords, INTRODUCTION, isChange, twoTexts, type StepSide } from '@/domain/revision/twoTexts';
import type { Procedure } from '@/domain/procedure/types';
import { changed, SAMPLE } from '../procedure/sample';
import { pair as pairOfProcedures } from './arbitraries';

function read(source: string): Procedure {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(parsed.errors[0]?.message);
  return parsed.procedure;
}
const base = read(SAMPLE);
const between = (from: Procedure | null, to: Procedure) =>
  twoTexts(compareProcedures(from, to), from?.frontmatter ?? null, to.frontmatter);
const marks = (side: StepSide | null) =>
  [side?.title, ...(side?.cautions ?? []).map(({ spans }) => spans), ...(side?.blocks ?? []).flatMap((b) => b.cells)]
    .flatMap((spans) => spans ?? [])
    .filter((span) => span.changed)
    .map(({ text }) => text);

describe('both texts step by step', () => {
  it('marks on each side what the other has not', () => {
    const pair = between(base, read(changed('nm: 10', 'nm: 12'))).find(({ id }) => id === 'draw-down');
    expect(pair?.kind).toBe('edited');
    expect(marks(pair?.old ?? null).join()).toContain('10 ±1 N·m');
    expect(marks(pair?.now ?? null).join()).toContain('12 ±1 N·m');
  });

  it('tells a step as edited where only the words of a caution ahead of it changed', () => {
    const [cool] = between(base, read(changed('avoid: Let the engine cool.', 'avoid: Let the engine cool down.')));
    expect(cool).toMatchObject({ id: 'cool', kind: 'edited' });
    expect(marks(cool?.now ?? null).join()).toContain('down');
  });

  it('tells it as edited where only the signal word changed, and names the other one on each side', () => {
    const [cool] = between(base, read(changed('signal: WARNING', 'signal: DANGER')));
    expect(cool?.kind).toBe('edited');
    expect(cool?.old?.cautions[0]).toMatchObject({ signal: 'WARNING', otherSignal: 'DANGER' });
    expect(cool?.now?.cautions[0]).toMatchObject({ signal: 'DANGER', otherSignal: 'WARNING' });
  });

  it('lets the introduction take part only where it changed', () => {
    expect(between(base, read(SAMPLE)).map(({ id }) => id)).toEqual(['cool', 'draw-down', 'check']);
    const other = between(base, read(changed('with the engine in the frame', 'with the engine on the stand')));
    expect(other[0]).toMatchObject({ id: INTRODUCTION, kind: 'edited' });
  });

  it('marks nothing of a new sheet, which nothing stands against', () => {
    const pairs = between(null, base);
    expect(pairs.map(({ id, kind, old }) => [id, kind, old])).toEqual(
      [INTRODUCTION, 'cool', 'draw-down', 'check'].map((id) => [id, 'added', null]),
    );
    expect(pairs.flatMap(({ now }) => marks(now))).toEqual([]);
  });

  it('shows each step of each text once, in place, and marks words only in steps that it tells as changed', () => {
    fc.assert(
      fc.property(pairOfProcedures, ([from, to]) => {
        const steps = between(from, to).filter(({ id }) => id !== INTRODUCTION);
        const numbers = (side: 'old' | 'now') => steps.flatMap((step) => step[side]?.number ?? []);
        expect(numbers('now')).toEqual(to.steps.map((_, i) => i + 1));
        expect(numbers('old').sort((a, b) => a - b)).toEqual(from.steps.map((_, i) => i + 1));
        for (const step of steps.filter(({ kind }) => kind === 'same'))
          expect([...marks(step.old), ...marks(step.now)]).toEqual([]);
      }),
    );
  });
});

describe('the changes in words', () => {
  it('counts an edited and moved step once and tells both', () => {
    const step = (kind: 'same' | 'edited' | 'added' | 'removed', moved = false) => ({ kind, moved });
    expect(changesInWords([step('edited', true), step('same', true), step('added'), step('same')])).toBe(
      '3 changes in the text: 1 edited, 1 added, 2 moved',
    );
    expect(changesInWords([step('removed')])).toBe('1 change in the text: 1 removed');
    expect(changesInWords([step('same')])).toBe('No step changes');
    expect([step('same'), step('same', true), step('edited')].map(isChange)).toEqual([false, true, true]);
  });
});
