import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UNIFIED_SERIES } from '@/domain/measure/inchThreads';
import { COARSE_PITCH, readThread } from '@/domain/measure/threads';
import { Thread } from '@/domain/procedure/schema';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, ODD_TEXTS, expectRefused, expectSound } from './sweep';

describe('readThread', () => {
  it('reads a metric thread with its pitch', () => {
    expect(valueOf(readThread('M8', 1.25))).toEqual({
      kind: 'metric',
      name: 'M8 × 1.25',
      diameter: 0.008,
      pitch: 0.00125,
      assumedCoarse: false,
    });
    expect(valueOf(readThread(' M10 '))).toMatchObject({ name: 'M10 × 1.5', pitch: 0.0015, assumedCoarse: true });
  });

  it('reads inch threads, numbered sizes too', () => {
    expect(valueOf(readThread('#10-32 UNF'))).toMatchObject({
      kind: 'unified',
      name: '#10-32 UNF',
      diameter: expect.closeTo(0.19 * 0.0254, 15),
      pitch: 0.0254 / 32,
    });
    expect(valueOf(readThread('1/4-20 UNC'))).toMatchObject({ diameter: 0.00635 });
  });

  it('leaves pipe threads without a diameter', () => {
    for (const text of ['G 1/4', 'G3/8', 'R 1/2', 'Rp 1'])
      expect(valueOf(readThread(text))).toEqual({ kind: 'pipe', name: text });
  });

  it.each<[string, number | undefined, string, string]>([
    ['', undefined, 'thread', 'The thread is missing; write it as M6, 1/4-20 UNC or G 1/4.'],
    ['M6x1', undefined, 'thread', '"M6x1" is no thread that the book reads; write it as M6, 1/4-20 UNC or G 1/4.'],
    ['M0', 1, 'thread', 'The thread must have a diameter of more than zero.'],
    ['M2', undefined, 'pitch', 'The pitch is missing, and the book holds no coarse pitch for M2; give it in mm.'],
    ['M6', 0, 'pitch', 'The pitch must be more than zero.'],
    ['M6', 10, 'pitch', 'A pitch of 10 mm is too coarse for M6; look at it with a gauge.'],
    ['1/4-28 UNC', undefined, 'thread', '1/4 UNC has 20 threads to the inch, not 28.'],
    ['#0-80 UNC', undefined, 'thread', '#0 is not made as UNC.'],
    ['1/3-20 UNC', undefined, 'thread', '1/3 is no size of the unified coarse or fine series.'],
    ['1/0-20 UNC', undefined, 'thread', '1/0 is no size of the unified coarse or fine series.'],
    ['#99-32 UNF', undefined, 'thread', '#99 is no size of the unified coarse or fine series.'],
    ['1/4-20 UNC', 1, 'pitch', 'A pitch in mm belongs to metric threads only.'],
    ['G 1/4', 1, 'pitch', 'A pitch in mm belongs to metric threads only.'],
  ])('refuses "%s" with pitch %s at %s', (text, pitch, field, message) => {
    expect(readThread(text, pitch)).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('reads what the schema takes, or says why not', () => {
    fc.assert(
      fc.property(
        fc.stringMatching(/^(M\d{1,2}(\.\d)?|(#\d{1,2}|\d{1,2}\/\d{1,2}|\d)-\d{1,2} UN[CF]|[RG]p? ?\d{1,2})$/),
        (text) => {
          fc.pre(Thread.safeParse(text).success);
          const read = readThread(text, /^M/.test(text) ? 0.2 : undefined);
          expectSound(read, /^(thread|pitch)$/);
          if (!read.ok) expect(read.problems[0]?.message).not.toContain('is no thread that');
        },
      ),
    );
  });

  it('holds only pitches and series that the schema can write', () => {
    for (const size of Object.keys(COARSE_PITCH)) expect(Thread.safeParse(`M${size}`).success).toBe(true);
    for (const [size, [coarse, fine]] of Object.entries(UNIFIED_SERIES)) {
      if (coarse !== null) expect(valueOf(readThread(`${size}-${coarse} UNC`)).kind).toBe('unified');
      expect(Thread.safeParse(`${size}-${fine} UNF`).success).toBe(true);
      if (coarse !== null && fine !== null) expect(fine).toBeGreaterThan(coarse);
    }
  });

  it('never throws, and never answers with what is no number', () => {
    for (const pitch of [...EXTREMES, ...NO_NUMBERS]) expectSound(readThread('M6', pitch), /^pitch$/);
    for (const text of [...ODD_TEXTS, ...(NO_NUMBERS as unknown as string[])])
      expectRefused(readThread(text), 'thread');
  });
});
