import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { convert, type Unit } from '@/domain/measure/convert';
import { neighbours } from '@/components/handbook/order';

const folder = 'content/handbook';
const pages = readdirSync(folder)
  .filter((name) => name.endsWith('.mdx'))
  .map((name) => {
    const [, front = '', ...body] = readFileSync(`${folder}/${name}`, 'utf8').split(/^---\n/m);
    const data: { title: string; summary: string; order: number } = parse(front);
    return { id: name.replace('.mdx', ''), data, body: body.join('---\n') };
  });
const body = (id: string) => pages.find((page) => page.id === id)?.body ?? '';
/** Cells of every table row, numbers without the spaces that group their digits. */
const rows = (id: string) =>
  body(id)
    .split('\n')
    .filter((line) => line.startsWith('|'))
    .map((line) =>
      line
        .slice(1, -1)
        .split('|')
        .map((cell) => cell.trim()),
    );
const figure = (cell: string | undefined) => Number((cell ?? '').replaceAll(' ', ''));

describe('the handbook', () => {
  it('numbers its pages from one without a gap', () => {
    expect(pages.map((page) => page.data.order).sort((a, b) => a - b)).toEqual(pages.map((_, i) => i + 1));
    expect(pages.length).toBeGreaterThanOrEqual(9);
  });

  it('knows the page before and after each', () => {
    const ordered = [...pages].sort((a, b) => a.data.order - b.data.order);
    expect(neighbours(pages, ordered[1]!.id)).toEqual({
      number: 2,
      of: pages.length,
      before: ordered[0],
      after: ordered[2],
    });
    expect(neighbours(pages, ordered[0]!.id).before).toBeUndefined();
    expect(neighbours(pages, ordered.at(-1)!.id).after).toBeUndefined();
    expect(neighbours(pages, 'no-such-page')).toMatchObject({ number: 0, before: undefined, after: undefined });
  });

  it.each(pages)('$id is a real page that names its sources and links only to what exists', ({ body: text }) => {
    expect(text.split(/\s+/).length).toBeGreaterThan(500);
    expect(text).toMatch(/^## Where this comes from$/m);
    for (const [, target] of text.matchAll(/\]\(\/handbook\/([^)]+)\)/g))
      expect(pages.map((page) => page.id)).toContain(target);
  });

  it.each(pages)('$id shows drawings in their own proportions', ({ body: text }) => {
    for (const [, file, width, height] of text.matchAll(/file="(.+)"\s+width=\{(\d+)\}\s+height=\{(\d+)\}/g)) {
      const path = `public/figures/${file}`;
      expect(existsSync(path), path).toBe(true);
      expect(readFileSync(path, 'utf8')).toContain(`viewBox="0 0 ${width} ${height}"`);
    }
  });
});

describe('numbers in the handbook', () => {
  it('convert as the book converts', () => {
    // NIST SP 811 prints seven digits.
    const named: Record<string, Unit> = { 'US quart': 'US qt', 'imperial quart': 'imp qt' };
    const checked = rows('units').filter(([from, to, by]) => {
      const [a, b] = [named[from ?? ''] ?? from, to] as [Unit, Unit];
      const made = convert(1, a, b);
      if (!made.ok || Number.isNaN(figure(by))) return false;
      expect(figure(by) / made.value, `${from} to ${to}`).toBeCloseTo(1, 6);
      return true;
    });
    expect(checked.length).toBeGreaterThanOrEqual(9);
  });

  it('follow ISO 898-1 from stress area and proof stress', () => {
    const bolts = rows('thread-and-property-class').filter(
      (row) => /^M\d+ × [\d.]+$/.test(row[0] ?? '') && row.length === 5,
    );
    expect(bolts).toHaveLength(6);
    for (const [thread = '', area, ...loads] of bolts) {
      const [d = 0, pitch = 0] = thread.slice(1).split(' × ').map(Number);
      const stressArea = (Math.PI / 4) * (d - 0.9382 * pitch) ** 2;
      expect(figure(area) / stressArea, thread).toBeCloseTo(1, 2);
      // The standard starts from rounded areas and prints three digits, some rounded down.
      [580, 830, 970].forEach((proof, i) =>
        expect(Math.abs((figure(loads[i]) * 1000) / (stressArea * proof) - 1), thread).toBeLessThan(0.007),
      );
    }
  });

  it('make three quarters of proof load at a nut factor of 0.20', () => {
    const torques = rows('thread-and-property-class').filter(
      (row) => /^M\d+ × [\d.]+$/.test(row[0] ?? '') && row.length === 4,
    );
    expect(torques).toHaveLength(5);
    for (const [thread = '', ...made] of torques) {
      const [d = 0, pitch = 0] = thread.slice(1).split(' × ').map(Number);
      const stressArea = (Math.PI / 4) * (d - 0.9382 * pitch) ** 2;
      [580, 830, 970].forEach((proof, i) =>
        expect(Math.abs(figure(made[i]) / ((0.2 * d * 0.75 * proof * stressArea) / 1000) - 1), thread).toBeLessThan(0.01),
      );
    }
  });
});
