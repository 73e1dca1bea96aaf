import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Limit, Torque } from '@/domain/procedure/schema';

const folder = 'content/procedures';
const files = readdirSync(folder).filter((name) => name.endsWith('.mdx'));
const sourceOf = (file: string) => readFileSync(`${folder}/${file}`, 'utf8');
const numbers = new Set(files.map((file) => `P-${file.slice(2, 6)}`));

const readings = new Map(files.map((file) => [file, parseProcedure(sourceOf(file))]));

function read(file: string) {
  const parsed = readings.get(file);
  if (!parsed?.ok) throw new Error(`${file}: ${parsed?.errors.map((e) => `${e.line}: ${e.message}`).join('; ')}`);
  return parsed;
}

/** Proof stress in MPa: ISO 898-1 (as kept in the reference values, up to M16). */
const PROOF: Record<string, number> = { '8.8': 580, '10.9': 830, '12.9': 970 };

/**
 * Share of proof load, by T = K·d·F with A_t = π/4·(d − 0.9382·P)² (ISO 898-1). K is 0.20 for a clean dry thread
 * and 0.15 for an oiled one: common practice, seen quoted, no standard. Null where the class is not stated.
 */
function shareOfProof({ thread, pitch, class: grade, condition, nm }: Torque): number | null {
  const proof = PROOF[grade ?? ''];
  if (proof === undefined || pitch === undefined) return null;
  const d = Number(thread.slice(1));
  const k = condition === 'oiled' || condition === 'anti-seize' ? 0.15 : 0.2;
  return nm / ((k * d) / 1000) / ((Math.PI / 4) * (d - 0.9382 * pitch) ** 2 * proof);
}

/** Four readings of the tool must fit into the band: the least ratio of gauge to tolerance that is accepted. */
const tooCoarse = ({ min, max, resolution }: Limit) =>
  min !== undefined && max !== undefined && resolution !== undefined && resolution * 4 > max - min + 1e-9;

it('agrees with the worked bolt of the trade: M6 class 8.8, dry, 10 N·m is near 72 % of proof load', () => {
  const bolt = read('p-0142-valve-cover-reseal.mdx').procedure.frontmatter.torques.find((t) => t.key === 'cover-bolt');
  expect(bolt && shareOfProof(bolt)).toBeCloseTo(0.72, 1);
});

describe.each(files)('%s', (file) => {
  it('is in canonical form, and a reviewer has nothing to remark', () => {
    const { canonical, notices } = read(file);
    expect(canonical === sourceOf(file)).toBe(true);
    expect(notices).toEqual([]);
  });

  it('has six to twenty steps, and stands on engines, drawings and sheets that exist', () => {
    const { procedure } = read(file);
    expect(procedure.steps.length).toBeGreaterThanOrEqual(6);
    expect(procedure.steps.length).toBeLessThanOrEqual(20);
    const { engines, figures } = procedure.frontmatter;
    expect(engines.filter((key) => !existsSync(`content/engines/${key}.yaml`))).toEqual([]);
    expect(figures.filter((figure) => !existsSync(`public/figures/${figure.file}`))).toEqual([]);
    const links = [...sourceOf(file).matchAll(/\/procedures\/(P-\d+)/g)].map((match) => match[1] ?? '');
    expect(links.filter((number) => !numbers.has(number))).toEqual([]);
  });

  it('asks no bolt for too much or too little of its proof load, and no gauge for what it cannot show', () => {
    const { torques, limits } = read(file).procedure.frontmatter;
    const over = torques.filter((torque) => (shareOfProof(torque) ?? 0) > 0.9);
    expect(over.map((torque) => torque.key)).toEqual([]);
    // A bolt that is turned through an angle afterwards starts lower.
    const slack = torques.filter((torque) => (shareOfProof(torque) ?? 1) < (torque.angles ? 0.25 : 0.4));
    expect(slack.map((torque) => torque.key)).toEqual([]);
    expect(limits.filter(tooCoarse).map((limit) => limit.key)).toEqual([]);
  });
});
