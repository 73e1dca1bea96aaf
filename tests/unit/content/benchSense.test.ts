import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import type { Torque } from '@/domain/procedure/schema';

/**
 * Whether the shipped procedures make sense at a bench, judged by published values:
 * stress area and proof load of ISO 898-1 (8.8 to M16: 580 MPa, 10.9: 830 MPa), T = K·F·d with the
 * handbook's K of 0.20 cleaned and dry, 0.15 lubricated. Gauges at least 4:1 as MIL-STD-1839 asks.
 * Stainless classes and plain plugs have no proof load there and are left out.
 */
const folder = 'content/procedures';
const PROOF: Record<string, number> = { '8.8': 580, '10.9': 830, '12.9': 970 };
const NUT_FACTOR: Partial<Record<Torque['condition'], number>> = { dry: 0.2, threadlocker: 0.2, oiled: 0.15 };

const procedures = readdirSync(folder)
  .filter((name) => name.endsWith('.mdx'))
  .map((name) => {
    const parsed = parseProcedure(readFileSync(`${folder}/${name}`, 'utf8'));
    if (!parsed.ok) throw new Error(`${name}: ${parsed.errors[0]?.message ?? 'does not parse'}`);
    return { name, ...parsed };
  });

/** Share of proof load, 0 to 1, that the torque alone makes; null where no standard says. */
function shareOfProof(t: Torque): number | null {
  const d = Number(/^M(\d+)/.exec(t.thread)?.[1]);
  const proof = PROOF[t.class ?? ''];
  const k = NUT_FACTOR[t.condition];
  if (!d || !proof || !k || !t.pitch) return null;
  const area = (Math.PI / 4) * (d - 0.9382 * t.pitch) ** 2;
  return (t.nm * 1000) / (k * d) / (proof * area);
}

const torques = procedures.flatMap((p) =>
  p.procedure.frontmatter.torques.map((t) => ({ at: `${p.name} ${t.key}`, t })),
);

describe.each(procedures)('$name', ({ procedure, notices }) => {
  it('has steps, sources and no notices', () => {
    expect(procedure.steps.length).toBeGreaterThanOrEqual(6);
    expect(procedure.steps.length).toBeLessThanOrEqual(20);
    expect(notices).toEqual([]);
  });

  it('names the origin of every value', () => {
    const { torques: all, limits } = procedure.frontmatter;
    expect([...all, ...limits].filter((value) => !value.source).map((value) => value.key)).toEqual([]);
  });

  it('shows drawings that exist', () => {
    for (const figure of procedure.frontmatter.figures)
      expect(existsSync(`public/figures/${figure.file}`), figure.file).toBe(true);
  });

  it('reads every two-sided limit with a gauge of at least 4:1', () => {
    for (const { key, min, max, resolution } of procedure.frontmatter.limits)
      if (min !== undefined && max !== undefined && resolution !== undefined)
        expect(resolution, key).toBeLessThanOrEqual((max - min) / 4 + 1e-9);
  });
});

describe('torques', () => {
  it('clamp between two and four fifths of proof load', () => {
    const checked = torques.filter(({ t }) => shareOfProof(t) !== null);
    expect(checked.length).toBeGreaterThan(10);
    for (const { at, t } of checked) {
      // Bolts that are turned through an angle afterwards start lower.
      expect(shareOfProof(t), at).toBeGreaterThanOrEqual(t.angles ? 0.25 : 0.4);
      expect(shareOfProof(t), at).toBeLessThanOrEqual(0.8);
    }
  });

  it('answer each bolt of an even circle with the one opposite', () => {
    const circles = torques.flatMap(({ at, t }) => {
      const places = t.order?.map((n) => t.positions?.[n - 1] ?? [0, 0]) ?? [];
      const middle = [0, 1].map((axis) => places.reduce((sum, p) => sum + (p[axis] ?? 0), 0) / places.length);
      const turned = places.map(([x = NaN, y = NaN]) => ({ x: x - (middle[0] ?? 0), y: y - (middle[1] ?? 0) }));
      const far = turned.map(({ x, y }) => Math.hypot(x, y));
      const isCircle = far.length >= 6 && far.length % 2 === 0 && Math.max(...far) - Math.min(...far) < 1;
      return isCircle ? [{ at, turned, radius: far[0] ?? 0 }] : [];
    });
    expect(circles.length).toBeGreaterThanOrEqual(3);
    for (const { at, turned, radius } of circles)
      for (let i = 0; i < turned.length; i += 2) {
        const [one, other] = [turned[i], turned[i + 1]];
        expect(Math.hypot((one?.x ?? 0) + (other?.x ?? 0), (one?.y ?? 0) + (other?.y ?? 0)), at).toBeLessThan(radius / 50);
      }
  });

  it('work outward from the middle of the main caps', () => {
    const caps = torques.find(({ at }) => at.endsWith('main-bolt'))?.t;
    const xs = (caps?.order ?? []).map((n) => caps?.positions?.[n - 1]?.[0] ?? NaN);
    const middle = (Math.min(...xs) + Math.max(...xs)) / 2;
    const far = xs.map((x) => Math.abs(x - middle));
    expect(far).toEqual([...far].sort((a, b) => a - b));
    expect(far).toHaveLength(10);
  });
});
