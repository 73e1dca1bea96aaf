import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';

const folder = 'content/procedures';
const torques = readdirSync(folder).flatMap((name) => {
  const parsed = parseProcedure(readFileSync(`${folder}/${name}`, 'utf8'));
  return parsed.ok ? parsed.procedure.frontmatter.torques.map((t) => ({ at: `${name} ${t.key}`, t })) : [];
});

/** By what the published circles share (US Army TB 9-3950-253-13&P): every odd step is followed by its opposite. */
describe('tightening orders', () => {
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
