import { describe, expect, it } from 'vitest';
import { Limit, Torque, type Part } from '@/domain/procedure/schema';
import { durationText, limitText, partText, threadText, torqueText } from '@/domain/procedure/values';

const torque = (fields: object = {}) =>
  Torque.parse({ key: 'b', name: 'Bolt', thread: 'M6', pitch: 1, condition: 'dry', nm: 10, count: 1, ...fields });
const limit = (fields: object) => Limit.parse({ key: 'l', name: 'Limit', quantity: 'length', unit: 'mm', ...fields });

describe('torqueText', () => {
  // 10 N·m = 88.507 lbf·in, 25 N·m = 18.439 lbf·ft, 100 N·m = 73.756 lbf·ft: NIST SP 811, appendix B.8.
  it.each([
    [{}, undefined, '10 N·m', '89 lbf·in'],
    [{ tolerance: 1 }, undefined, '10 ±1 N·m', '89 ±9 lbf·in'],
    [{ passes: [5] }, 1, '5 N·m', '44 lbf·in'],
    [{ passes: [5] }, 2, '10 N·m', '89 lbf·in'],
    [{ nm: 100, passes: [30, 60] }, 2, '60 N·m', '44.5 lbf·ft'],
    [{ nm: 100 }, undefined, '100 N·m', '74 lbf·ft'],
    [{ nm: 30, angles: [90] }, undefined, '30 N·m, then 90°', '22 lbf·ft, then 90°'],
    [{ nm: 30, angles: [90, 90], angleTolerance: 5 }, undefined, '30 N·m, then 90° and 90°, each ±5°', '22 lbf·ft, then 90° and 90°, each ±5°'],
  ])('%j pass %s', (fields, pass, metric, inch) => {
    expect(torqueText(torque(fields), { pass })).toEqual({ metric, inch });
  }); // prettier-ignore
});

describe('limitText', () => {
  it.each([
    [{ min: 0.02, max: 0.06, resolution: 0.01 }, '0.02 to 0.06 mm', '0.0008 to 0.0024 in'],
    [{ max: 0.05, resolution: 0.01 }, '0.05 mm or less', '0.0020 in or less'],
    // Never rounded to the steps of the tool: that would allow more than the sheet does.
    [{ max: 0.015, resolution: 0.002 }, '0.015 mm or less', '0.0006 in or less'],
    [{ min: 0.125, max: 0.5, resolution: 0.1 }, '0.125 to 0.500 mm', '0.005 to 0.020 in'],
    [{ min: 40 }, '40 mm or more', '1.575 in or more'],
    [{ nominal: 2.5, resolution: 0.05 }, '2.50 mm', '0.098 in'],
    [{ min: 345, nominal: 350, max: 355, quantity: 'pressure', unit: 'kPa' }, '350 (345 to 355) kPa', '51 (50 to 51) psi'],
    [{ min: 2, max: 2 }, '2 mm', '0.0787 in'],
    [{ max: 20, quantity: 'share', unit: '%' }, '20 % or less', '20 % or less'],
    [{ quantity: 'finding', unit: undefined, expect: 'none allowed' }, 'none allowed', 'none allowed'],
  ])('%j', (fields, metric, inch) => {
    expect(limitText(limit(fields))).toEqual({ metric, inch });
  }); // prettier-ignore
});

it.each([
  [0.5, '30 s'],
  [10, '10 min'],
  [1.5, '1 min 30 s'],
  [90, '1 h 30 min'],
  [1440, '24 h'],
  [2880, '48 h'],
  [10_080, '7 days'],
])('durationText(%s)', (minutes, text) => expect(durationText(minutes)).toBe(text));

it.each([
  [{ length: 25, class: '8.8' }, 'M6×1.0×25, class 8.8, dry'],
  [{ thread: 'M10', pitch: 1.25, condition: 'oiled' }, 'M10×1.25, oiled'],
  [{ thread: '1/4-20 UNC', pitch: undefined, class: 'SAE 5', condition: 'threadlocker' }, '1/4-20 UNC, SAE grade 5, with threadlocker'],
])('threadText(%j)', (fields, text) => expect(threadText(torque(fields))).toBe(text)); // prettier-ignore

describe('partText', () => {
  const part = (name: string): Part => ({ key: 'x', name, quantity: 1, action: 'replace' });
  const gasket = part('Cover gasket, moulded');

  it('reads as a word of the sentence', () => {
    expect(partText(gasket, [gasket], false)).toBe('cover gasket');
    expect(partText(gasket, [gasket], true)).toBe('Cover gasket');
    expect(partText(part('O-ring'), [part('O-ring')], false)).toBe('O-ring');
    expect(partText(part('PCV valve'), [part('PCV valve')], false)).toBe('PCV valve');
  });

  it('keeps what tells two parts apart', () => {
    const [front, rear] = [part('Crank seal, front'), part('Crank seal, rear')];
    expect(partText(front, [front, rear], false)).toBe('crank seal, front');
  });
});
