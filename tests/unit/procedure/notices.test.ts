import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { figuresInProse } from '@/domain/procedure/proseFigures';
import { changed, placeIn } from './sample';

function notices(source: string) {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors));
  return parsed.notices;
}

/** [change from, to, where it must point, sentence, place in the form] */
const NOTICED: [string, string, string, string, string][] = [
  [' Soak the baffle, <Timer of="soak" />.', '', 'soak\n', 'Timer 1 (Soak the baffle) is used in no step.', 'timers.0'],
  ['<Figure of="underside" />\n', '', 'underside\n', 'Figure 1 (Underside of the cover) is used in no step.', 'figures.0'],
  ['<Caution of="hot-oil" />\n\n', '', 'hot-oil\n', 'Caution 1 (Hot oil and hot metal) stands before no step. Put it before the step it guards.', 'cautions.0'],
  ['    order: [1, 3, 2, 4]\n    source: demo\n', '    order: [1, 3, 2, 4]\n', 'cover-bolt\n    name: Cover bolt\n', 'Torque 1 (Cover bolt) names no source. Say where the value comes from.', 'torques.0.source'],
  [', <Timer of="silicone" stage="cure" />', '', '1440', 'Supply 1 (Silicone sealant) has a cure time, but no step waits for it: <Timer of="silicone" stage="cure" />.', 'supplies.0.cure'],
  ['Do this with', 'Wait 20 minutes with', 'Wait 20', '"20 minutes" is written out here. Where hands act on it, put it under timers and write <Timer of="…" />, so that it stands in one place.', 'intro'],
]; // prettier-ignore

describe('notices', () => {
  it.each(NOTICED)('%j → %j', (from, to, at, message, path) => {
    const source = changed(from, to);
    expect(notices(source)).toEqual([{ ...placeIn(source, at), message, path }]);
  });

  // What the rules go by stands in tests/unit/procedure/clamp.test.ts and tests/unit/measure.
  it('says that a torque is beyond its fastener, and which unit it may have been in', () => {
    const source = changed('nm: 10\n', 'nm: 89\n');
    const [notice, ...more] = notices(source);
    expect(more).toEqual([]);
    expect(notice).toMatchObject({ ...placeIn(source, '89\n'), path: 'torques.0.nm' });
    expect(notice?.message).toMatch(/^Torque 1 \(Cover bolt\): The final torque clamps to \d+ % of proof load/);
    expect(notice?.message).toContain('the same figure in lbf·in would be sensible');
  });

  it('says that an order of a row starts at its end', () => {
    const row = changed('[[0, 0], [200, 0], [200, 120], [0, 120]]', '[[0, 0], [60, 0], [120, 0], [180, 0]]');
    const source = row.replace('order: [1, 3, 2, 4]', 'order: [1, 2, 3, 4]');
    const [notice, ...more] = notices(source);
    expect(more).toEqual([]);
    expect(notice).toMatchObject({ ...placeIn(source, '[1, 2, 3, 4]'), path: 'torques.0.order' });
    expect(notice?.message).toMatch(/^Torque 1 \(Cover bolt\): /);
    expect(notices(row.replace('order: [1, 3, 2, 4]', 'order: [2, 3, 1, 4]'))).toEqual([]);
  });

  it('names a step without words', () => {
    const source = changed('Wait until the sealant has cured, <Timer of="silicone" stage="cure" />.\n\n', '')
      .replace('<Worksheet kind="readings" of="weep gap" />\n', '')
      .replace('with a gap of <Limit of="gap" />', 'with a gap of <Limit of="gap" /> and <Limit of="weep" />');
    expect(notices(source).map((n) => n.message)).toContain('Step 3 (Look for leaks) has a title and no words.');
  });
});

describe('figures in prose', () => {
  it.each([
    ['Tighten to 10 N·m.', ['10 N·m'], 'Torque'],
    ['Tighten to 10Nm, then 7.5 lbf·ft.', ['10Nm', '7.5 lbf·ft'], 'Torque'],
    ['A gap of 0,35 mm at most.', ['0,35 mm'], 'Limit'],
    ['It holds 2 bar and 100 °C.', ['2 bar', '100 °C'], 'Limit'],
    ['Leave it 24 hours.', ['24 hours'], 'Timer'],
  ])('%s', (prose, texts, component) => {
    expect(figuresInProse(prose).map((f) => f.text)).toEqual(texts);
    expect(figuresInProse(prose).every((f) => f.component === component)).toBe(true);
  });

  it.each([
    'Use the 10 mm socket.',
    'Turn bolt 4 in.',
    'Lay all 11 bolts out.',
    'An M6x25 bolt.',
    'See P-0142.',
    'Fit 2 new seals.',
  ])('not in: %s', (prose) => expect(figuresInProse(prose)).toEqual([]));
});
