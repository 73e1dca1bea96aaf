import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { chipLine, chipWords } from '@/domain/writing/chipWords';
import { readDraft } from '@/domain/writing/readDraft';

const draft = () => readDraft(readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8'))!;
/** Fixed blanks read as blanks. */
const said = (name: string, given: Record<string, string>, of = draft()) =>
  chipLine(chipWords(name, given, of)).replace(/\u00a0/g, ' ');

describe('what a component says while it is written about', () => {
  it.each([
    ['Torque', { of: 'cover-bolt' }, 'Cover bolt 10 ±1 N·m'],
    ['Torque', { of: 'cover-bolt', pass: '1' }, 'Cover bolt, first pass 5 N·m'],
    ['Limit', { of: 'gasket-proud' }, 'Gasket proud of its groove, all round 0.80 to 1.40 mm'],
    ['Limit', { of: 'weep' }, 'Weep after warm-up none allowed'],
    ['Part', { of: 'cover-gasket' }, 'Cover gasket, moulded'],
    ['Timer', { of: 'soak' }, 'Soak the breather baffle 10 min'],
    ['Timer', { of: 'silicone', stage: 'cure' }, 'Sensor-safe silicone sealant, cures 24 h'],
    ['Figure', { of: 'underside' }, 'The cover from below. Sealant goes only on the two joints with the front cover.'],
    ['Worksheet', { kind: 'readings', of: 'weep' }, 'readings for Weep after warm-up'],
  ])('%s %j', (name, given, words) => expect(said(name, given)).toBe(words));

  it.each([
    ['Torque', { of: 'cover-bot' }, 'There is no torque “cover-bot”'],
    ['Torque', { of: 'cover-bolt', pass: '2' }, 'Cover bolt has no pass 2'],
    ['Torque', { of: 'cover-bolt', pass: '01' }, 'Cover bolt has no pass 01'],
    ['Timer', { of: 'silicone', stage: 'boil' }, 'Sensor-safe silicone sealant has no time “boil”'],
    ['Worksheet', { kind: 'readings', of: 'weep gone' }, 'There is no limit “gone”'],
    ['Worksheet', { kind: 'guess' }, 'There is no worksheet “guess”'],
  ])('says plainly that it points at nothing: %s %j', (name, given, words) => {
    expect(said(name, given)).toBe(words);
    expect(chipWords(name, given, draft()).target).toBeNull();
  });

  it('follows what is typed, also while it is not yet a number', () => {
    const half = draft();
    half.torques[0]!['nm'] = '12,5';
    expect(said('Torque', { of: 'cover-bolt' }, half)).toBe('Cover bolt 12.5 ±1.0 N·m');
    half.torques[0]!['nm'] = '12 or so';
    expect(said('Torque', { of: 'cover-bolt' }, half)).toBe('Cover bolt 12 or so N·m');
    half.torques[0]!['nm'] = '';
    expect(said('Torque', { of: 'cover-bolt' }, half)).toBe('Cover bolt no value yet');
    half.limits[0]!['max'] = '';
    half.limits[0]!['unit'] = '';
    expect(said('Limit', { of: 'gasket-proud' }, half)).toBe('Gasket proud of its groove, all round 0.8');
    half.timers[0]!['minutes'] = 'ten';
    expect(said('Timer', { of: 'soak' }, half)).toBe('Soak the breather baffle ten min');
  });

  it('knows where its value is written', () => {
    expect(chipWords('Torque', { of: 'coil-bolt' }, draft()).target).toEqual({
      list: 'torques',
      index: 1,
      field: 'nm',
    });
    expect(chipWords('Timer', { of: 'silicone', stage: 'skin-over' }, draft()).target).toEqual({
      list: 'supplies',
      index: 0,
      field: 'skinOver',
    });
  });
});
