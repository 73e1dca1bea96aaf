import { describe, expect, it } from 'vitest';
import { clampChecks, clampOf, clampText, sizeMixUp } from '@/domain/procedure/clamp';
import { coarseTool, gaugeText } from '@/domain/procedure/gauge';
import { Limit, Torque } from '@/domain/procedure/schema';
import { clampChanges } from '@/domain/revision/clampChanges';
import { Frontmatter } from '@/domain/procedure/schema';

const torque = (fields: object = {}) =>
  Torque.parse({
    key: 'cover-bolt',
    name: 'Cover bolt',
    thread: 'M6',
    pitch: 1,
    class: '8.8',
    condition: 'dry',
    nm: 10,
    count: 1,
    ...fields,
  });
const limit = (fields: object) => Limit.parse({ key: 'l', name: 'Limit', quantity: 'length', unit: 'mm', ...fields });
const sheet = (...torques: object[]) =>
  Frontmatter.parse({
    title: 'Sheet',
    summary: 'A sheet.',
    system: 'fuel',
    engines: ['tarn-t18f'],
    minutes: 10,
    skill: 'technician',
    torques: torques.map((fields) => torque(fields)),
  });

describe('the clamp check of a torque', () => {
  // M6 8.8, 10 N·m dry: F = 10/(0.20·0.006) = 8.33 kN against 11.6 kN of proof load (ISO 898-1 table, quoted): 72 %.
  // Within 0.6 %, because the table rounds its stress areas.
  it('shows the load in both units and its share of proof load', () => {
    const check = clampOf(torque());
    expect(check?.verdict).toBe('ok');
    expect(check?.share).toBeCloseTo(0.718, 2);
    expect(check && clampText(check)).toEqual({
      metric: '8.3 kN, 71 % of proof load',
      inch: '1870 lbf, 71 % of proof load',
    });
  });

  it('gives the load alone where the class is not known, and nothing for a pipe thread', () => {
    const bare = clampOf(torque({ class: undefined }));
    expect(bare && clampText(bare)).toEqual({ metric: '8.3 kN', inch: '1870 lbf' });
    const pipe = clampOf(torque({ thread: 'G 1/4', pitch: undefined, class: undefined }));
    expect(pipe?.verdict).toBe('unknown');
    expect(pipe && clampText(pipe)).toBeNull();
  });

  it('tells a figure that was meant in another unit', () => {
    // 89 lbf·in written as 89 N·m on an M6: eight times what the bolt bears.
    expect(sizeMixUp(torque({ nm: 89 }))).toContain('lbf·in');
    expect(sizeMixUp(torque())).toBeNull();
  });

  it('names every torque with its place', () => {
    const [first, second] = clampChecks([torque(), torque({ key: 'b', nm: 30 })]);
    expect(first).toMatchObject({ path: 'torques.0', verdict: 'ok', nutFactor: 0.2, mixUp: null });
    expect(second).toMatchObject({ path: 'torques.1', verdict: 'over' });
    expect(second?.message).toMatch(/^The final torque clamps to 21\d % of proof load/);
  });
});

describe('clamp loads in a comparison', () => {
  it('stand there for a changed torque, then and now, and not for one that stays', () => {
    const from = sheet({}, { key: 'stay', name: 'Stays' });
    const to = sheet({ nm: 12 }, { key: 'stay', name: 'Stays' });
    expect(clampChanges(from, to)).toEqual([
      {
        key: 'cover-bolt',
        name: 'Cover bolt',
        from: '8.3 kN, 71 % of proof load',
        to: '10.0 kN, 86 % of proof load',
        verdict: 'ok',
        why: 'The final torque clamps to 86 % of proof load.',
        mixUps: [],
      },
    ]);
  });

  it.each([
    ['another condition', { condition: 'anti-seize' }],
    ['another class', { class: '10.9' }],
    ['another pitch', { pitch: 0.75 }],
    ['turns after it', { angles: [90] }],
  ])('follow %s', (_, fields) => {
    expect(clampChanges(sheet({}), sheet(fields))).toHaveLength(1);
  });

  it('leave out what the load does not depend on', () => {
    expect(clampChanges(sheet({}), sheet({ note: 'New washers', count: 4, tolerance: 1 }))).toEqual([]);
  });

  it('say when a change looks like a mix-up of units', () => {
    const [change] = clampChanges(sheet({}), sheet({ nm: 88.5 }));
    expect(change?.verdict).toBe('over');
    expect(change?.mixUps.join(' ')).toContain('lbf·in');
  });

  it('judge every torque of a new sheet', () => {
    expect(clampChanges(null, sheet({}, { key: 'b' })).map(({ from, key }) => [key, from])).toEqual([
      ['cover-bolt', null],
      ['b', null],
    ]);
  });
});

describe('the gauge for a limit', () => {
  // Ten steps to the tolerance: National Physical Laboratory, FAQ (seen). Divisions of 1, 2 and 5: common practice, no source.
  it.each([
    [{ min: 0.02, max: 0.06 }, '0.002 mm', '0.0001 in'],
    [{ max: 0.05 }, '0.005 mm', '0.0001 in'],
    [{ min: 20, max: 20.5 }, '0.05 mm', '0.001 in'],
    [{ min: 300, max: 350, quantity: 'pressure', unit: 'kPa' }, '5 kPa', '0.5 psi'],
    [{ min: 20, max: 30, quantity: 'temperature', unit: '°C' }, '1 °C', '1 °F'],
  ])('%j is read to %s or %s', (fields, metric, inch) => {
    expect(gaugeText(limit(fields))).toEqual({ metric, inch });
  });

  it.each([
    [{ min: 40 }],
    [{ nominal: 2.5 }],
    [{ min: 2, max: 2 }],
    [{ max: 20, quantity: 'share', unit: '%' }],
    [{ quantity: 'finding', unit: undefined, expect: 'none allowed' }],
  ])('%j has no tolerance to divide', (fields) => expect(gaugeText(limit(fields))).toBeNull());

  it('speaks up where the tool that the limit names cannot tell in from out', () => {
    expect(coarseTool(limit({ min: 0.02, max: 0.06, resolution: 0.02 }))).toBe(
      'Fewer than four steps of 0.02 mm fit into this tolerance; a reading near its end is a guess.',
    );
    expect(coarseTool(limit({ min: 0.02, max: 0.06, resolution: 0.01 }))).toBeNull();
    expect(coarseTool(limit({ min: 0.02, max: 0.06 }))).toBeNull();
    // A feeler of the limit's own size goes or does not go.
    expect(coarseTool(limit({ max: 0.05, resolution: 0.05 }))).toBeNull();
  });
});
