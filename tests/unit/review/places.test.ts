import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placesOf, standsAt, unplaced } from '@/components/review/places';
import { INTRODUCTION, type StepPair, type StepSide } from '@/domain/revision/twoTexts';
import type { ValueRow } from '@/domain/revision/valueRows';
import { remark } from '../../factories/proposal';

const side = (number: number | null, title: string): StepSide => ({
  number,
  title: [
    { text: title.slice(0, 3), changed: true },
    { text: title.slice(3), changed: false },
  ],
  cautions: [],
  blocks: [],
});
const pair = (id: string, old: StepSide | null, now: StepSide | null): StepPair => ({
  id,
  kind: 'edited',
  moved: false,
  effects: [],
  critical: null,
  old,
  now,
});
const value = (path: string, label: string) => ({ path, label }) as ValueRow;

describe('what a reason can be tied to', () => {
  it('offers the whole, then the values that change, then the steps by number and title', () => {
    const pairs = [
      pair(INTRODUCTION, null, side(null, 'Introduction')),
      pair('wipe', side(1, 'Wipe'), side(1, 'Wipe it dry')),
      pair('gone', side(2, 'Measure the bar'), null),
    ];
    expect(placesOf(pairs, [value('torques.bolt.nm', 'Cover bolt')])).toEqual([
      { value: '', label: 'The whole proposal' },
      { value: 'torques.bolt.nm', label: 'Value: Cover bolt' },
      { value: `step:${INTRODUCTION}`, label: 'Introduction' },
      { value: 'step:wipe', label: 'Step 1: Wipe it dry' },
      { value: 'step:gone', label: 'Step 2 (removed): Measure the bar' },
    ]);
  });
});

describe('where a remark stands', () => {
  const shown = { steps: new Set(['wipe']), paths: ['torques.bolt.nm', 'limits.gap.max', 'limits.gap.min', 'title'] };

  it('stands at its step or its value', () => {
    expect(standsAt('step:wipe', shown)).toBe('step:wipe');
    expect(standsAt('title', shown)).toBe('title');
  });

  it('stands at the first changed field of the entry that it is about, and not at one of a like name', () => {
    expect(standsAt('limits.gap', shown)).toBe('limits.gap.max');
    expect(standsAt('limits.ga', shown)).toBeNull();
    expect(standsAt('torques.bolt', { ...shown, paths: ['torques.bolt-2.nm'] })).toBeNull();
  });

  it('stands in the head where it is on the whole or its place is gone, and says which', () => {
    const remarks = [remark(null), remark('step:wipe'), remark('step:gone'), remark('limits.weep.max')];
    expect(unplaced(remarks, shown).map(({ remark: { anchor }, about }) => [anchor, about])).toEqual([
      [null, undefined],
      ['step:gone', 'about a step that is no longer there'],
      ['limits.weep.max', 'about a value that no longer changes'],
    ]);
  });

  it('loses no remark: each stands either at a place that is shown or in the head', () => {
    const anchor = fc.option(
      fc.constantFrom('step:wipe', 'step:x', 'step:', 'limits.gap', 'limits.gap.max', 'title', 'x', ''),
    );
    fc.assert(
      fc.property(fc.array(anchor), (anchors) => {
        const remarks = anchors.map((a) => remark(a));
        const places = [...shown.paths, ...[...shown.steps].map((id) => `step:${id}`)];
        const placed = places.flatMap((place) => remarks.filter((r) => standsAt(r.anchor, shown) === place));
        expect(placed.length + unplaced(remarks, shown).length).toBe(remarks.length);
      }),
    );
  });
});
