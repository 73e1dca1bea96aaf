import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { singleKey } from '@/components/ui/singleKeys';

class Element {
  isContentEditable = false;
  constructor(readonly tagName: string) {}
}
const dataset: Record<string, string> = {};
beforeEach(() => {
  delete dataset['shortcuts'];
  vi.stubGlobal('HTMLElement', Element);
  vi.stubGlobal('document', { documentElement: { dataset } });
});
afterEach(() => vi.unstubAllGlobals());

const press = (change: object = {}) => singleKey({ key: 'n', target: new Element('MAIN'), ...change } as never);

it('acts on a key that is pressed alone', () => {
  expect(press()).toBe('n');
  expect(press({ target: null })).toBe('n');
});

it.each(['ctrlKey', 'metaKey', 'altKey', 'isComposing'])('leaves alone a key with %s', (held) =>
  expect(press({ [held]: true })).toBeNull(),
);

it.each(['INPUT', 'TEXTAREA', 'SELECT'])('leaves alone what is typed into a field: %s', (tag) =>
  expect(press({ target: new Element(tag) })).toBeNull(),
);

it('leaves alone what is written into a text on the page', () => {
  expect(press({ target: Object.assign(new Element('DIV'), { isContentEditable: true }) })).toBeNull();
});

it('acts on none for whoever switched them off', () => {
  dataset['shortcuts'] = 'off';
  expect(press()).toBeNull();
});
