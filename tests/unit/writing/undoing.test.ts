import { readFileSync } from 'node:fs';
import { describe, expect, it, vi } from 'vitest';
import { Undoing } from '@/components/writing/undoing';
import { wayOfKey } from '@/components/writing/useUndoing';
import { readDraft } from '@/domain/writing/readDraft';

const sheet = () => readDraft(readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8'))!;

describe('undo at the desk', () => {
  it('copies what the form changes in place, and tells only what is new to tell', () => {
    const form = sheet();
    const undoing = new Undoing(form, () => 0);
    const told = vi.fn();
    undoing.subscribe(told);
    form.steps[0]!.title = 'W';
    undoing.record(form);
    form.steps[0]!.title = 'Wi';
    undoing.record(form);
    expect([told.mock.calls.length, undoing.snapshot()]).toEqual([1, { undo: 'step 1 changed', redo: null }]);
    expect(undoing.step('undo')).toEqual({
      draft: sheet(),
      said: 'step 1 changed',
      path: `steps.${sheet().steps[0]!.id}.title`,
    });
    expect([undoing.step('undo'), undoing.snapshot()]).toEqual([null, { undo: null, redo: 'step 1 changed' }]);
    expect(undoing.step('redo')?.draft.steps[0]?.title).toBe('Wi');
    undoing.restart(sheet());
    expect(undoing.snapshot()).toEqual({ undo: null, redo: null });
  });

  it.each([
    [{ key: 'z', ctrlKey: true }, 'undo'],
    [{ key: 'z', metaKey: true }, 'undo'],
    [{ key: 'Z', ctrlKey: true, shiftKey: true }, 'redo'],
    [{ key: 'Z', metaKey: true, shiftKey: true }, 'redo'],
    [{ key: 'y', ctrlKey: true }, 'redo'],
    [{ key: 'y', metaKey: true }, null],
    [{ key: 'z' }, null],
    [{ key: 'z', ctrlKey: true, altKey: true }, null],
    [{ key: 'x', ctrlKey: true }, null],
  ])('%o is %s', (given, way) => {
    const none = { ctrlKey: false, metaKey: false, shiftKey: false, altKey: false };
    expect(wayOfKey({ ...none, ...given })).toBe(way);
  });
});
