import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareValues } from '@/domain/revision/compareValues';
import type { ValueChange } from '@/domain/revision/types';
import { beyondName, isAtTheBench, valueRows } from '@/domain/revision/valueRows';
import { frontmatter } from './arbitraries';

const value = (change: Partial<ValueChange>): ValueChange => ({
  path: 'torques.bolt.nm',
  list: 'torques',
  key: 'bolt',
  kind: 'changed',
  label: 'Cover bolt',
  detail: null,
  from: '10 N·m',
  to: '12 N·m',
  percent: 20,
  effect: null,
  critical: null,
  ...change,
});

describe('values set for showing', () => {
  it('marks a number whole, and a sentence word by word', () => {
    const [number, sentence] = valueRows([
      value({}),
      value({ from: 'Wear gloves and wash before you eat.', to: 'Wear gloves and wash before you eat or drink.' }),
    ]);
    expect(number).toMatchObject({ prose: false, old: [{ text: '10 N·m', changed: true }] });
    expect(sentence?.prose).toBe(true);
    expect(sentence?.old?.some(({ changed }) => changed)).toBe(false);
    expect(sentence?.now?.filter(({ changed }) => changed).map(({ text }) => text)).toEqual(['or drink']);
  });

  it('leaves a side empty that has no such value', () => {
    const [row] = valueRows([value({ kind: 'added', from: null })]);
    expect([row?.old, row?.now]).toEqual([null, [{ text: '12 N·m', changed: true }]]);
  });

  it('names engines as a sheet does, and nothing else by their keys', () => {
    const names = new Map([
      ['tarn-t18f', 'Tarn T18F'],
      ['title', 'No'],
    ]);
    const engines = { path: 'engines', list: 'head', from: 'tarn-t18f', to: 'tarn-t18f, other' } as const;
    const [row, title] = valueRows(
      [value(engines), value({ path: 'title', list: 'head', from: null, to: 'title' })],
      names,
    );
    expect([row?.from, row?.to, title?.to]).toEqual(['Tarn T18F', 'Tarn T18F, other', 'title']);
  });

  it('shows every character of both texts, whatever it marks', () => {
    fc.assert(
      fc.property(frontmatter, frontmatter, (from, to) => {
        const rows = valueRows(compareValues(from, to).map(({ change }) => change));
        for (const row of rows) {
          const text = (spans: typeof row.old) => spans?.map((span) => span.text).join('') ?? null;
          expect([text(row.old), text(row.now)]).toEqual([row.from, row.to]);
        }
      }),
    );
  });
});

describe('what an entry of a new sheet says beyond its name', () => {
  const said = (label: string, detail: string | null, to: string | null) => beyondName({ label, detail, to });

  it('leaves out what stands beside it', () => {
    expect(said('Silicone', null, 'Silicone, skins over in 10 min')).toBe('skins over in 10 min');
    expect(said('Torque wrench', '2 to 25 N·m', 'Torque wrench, 2 to 25 N·m')).toBe('');
    expect(said('Solvent', null, 'Solvent')).toBe('');
    expect(said('Hot oil', 'WARNING', 'WARNING: Hot oil; burns skin. Let it cool.')).toBe('burns skin. Let it cool.');
    expect(said('Shop trial', 'shop', 'Shop trial. Nine pans.')).toBe('Nine pans.');
  });

  it('says all of a text that only begins alike', () => {
    expect(said('Cover', null, 'Cover bolt, dry')).toBe('Cover bolt, dry');
    expect(said('Cover bolt', 'M6', '10 ±1 N·m')).toBe('10 ±1 N·m');
    expect(said('Cover bolt', 'M6', null)).toBe('');
  });
});

it('puts apart what hands act on', () => {
  expect((['torques', 'cautions', 'tools'] as const).every((list) => isAtTheBench({ list }))).toBe(true);
  expect((['head', 'figures', 'sources'] as const).some((list) => isAtTheBench({ list }))).toBe(false);
});
