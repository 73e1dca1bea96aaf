import { expect, it } from 'vitest';
import type { Frontmatter, Torque } from '@/domain/procedure/schema';
import { failingTorques } from '@/domain/revision/failingTorques';

// Computed here: M6×1 has A_s = 20.1 mm²; class 8.8 up to M16 has S_p = 580 MPa (ISO 898-1, from memory), so proof load is
// 11.66 kN. Dry, K = 0.2: 20 N·m clamps 20 / (0.2 · 0.006) = 16.67 kN, 143 %; 13 N·m 10.83 kN, 93 %.
const torque = (key: string, nm: number, change: Partial<Torque> = {}): Torque =>
  ({ key, name: key, thread: 'M6', pitch: 1, class: '8.8', condition: 'dry', nm, ...change }) as Torque;
const sheet = (...torques: Torque[]) => ({ torques }) as Frontmatter;
const keys = (from: Frontmatter | null, to: Frontmatter) => failingTorques(from, to).map(({ key }) => key);

it('names every torque past proof load of a new sheet, with its share', () => {
  const failing = failingTorques(null, sheet(torque('a', 20), torque('b', 13), torque('c', 24)));
  expect(failing).toMatchObject([
    { key: 'a', name: 'a' },
    { key: 'c', name: 'c' },
  ]);
  expect(failing[0]?.share).toBeCloseTo(1.43, 2);
});

it('names of a change only what is new or has another load', () => {
  const base = sheet(torque('stays', 20), torque('rises', 13), torque('drier', 20));
  const now = sheet(
    torque('stays', 20),
    torque('rises', 20),
    torque('drier', 20, { condition: 'oiled' }),
    torque('new', 20),
  );
  expect(keys(base, now)).toEqual(['rises', 'drier', 'new']);
});

it('lets a mend of another line pass, and another name of the same bolt', () => {
  const base = sheet(torque('stays', 20));
  expect(keys(base, sheet(torque('stays', 20, { name: 'Cover bolt, long' })))).toEqual([]);
  // Under another key nobody can tell that it is the same bolt.
  expect(keys(base, sheet(torque('long', 20)))).toEqual(['long']);
});

it('says nothing of what is within proof load, or cannot be judged', () => {
  expect(keys(null, sheet(torque('a', 13)))).toEqual([]);
  const { class: _, ...unknown } = torque('a', 99);
  expect(keys(null, sheet(unknown as Torque))).toEqual([]);
  // Past the torque of the joint the bolt yields on purpose, but the first torque alone must not do it.
  expect(keys(null, sheet(torque('a', 8, { angles: [90] }), torque('b', 20, { angles: [90] })))).toEqual(['b']);
});
