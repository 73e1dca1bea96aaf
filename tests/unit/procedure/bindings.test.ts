import { describe, expect, it } from 'vitest';
import { bindingFault, bindingsIn, limitKeysIn } from '@/domain/procedure/bindings';
import { keysIn } from '@/domain/writing/uses';
import { byField, filledBy, type BoundLimit } from '@/components/worksheets/bound';
import { band, quantity } from '@/domain/worksheets/fields';

describe('the limits that a worksheet names', () => {
  it('judge a field, or are only listed', () => {
    expect(bindingsIn(' clearance:main-clearance  oil-level ')).toEqual([
      { field: 'clearance', key: 'main-clearance' },
      { field: null, key: 'oil-level' },
    ]);
    expect(bindingsIn(undefined)).toEqual([]);
    expect(limitKeysIn('a:b c d:b')).toEqual(['b', 'c']);
  });

  it('count as used where the form asks what an entry is used for', () => {
    expect(keysIn('<Worksheet kind="bore" of="taper:bore-taper weep" />', 'limits')).toEqual(['bore-taper', 'weep']);
  });

  it('are refused for a field that is no limit', () => {
    expect(bindingFault('units', { field: 'measure', key: 'x' }, undefined)).toContain('is no limit of this worksheet');
    expect(bindingFault('units', { field: '__proto__', key: 'x' }, undefined)).toContain('is no limit');
    expect(bindingFault('units', { field: null, key: 'x' }, undefined)).toBeNull();
  });
});

describe('limits of a sheet in the boxes of a worksheet', () => {
  const fields = {
    bore: quantity('mm', { label: 'Bore' }),
    clearance: band('mm', { label: 'Clearance' }),
    diameter: band('mm', { label: 'Diameter', nominal: 'bore' }),
  };
  const limit = (field: string, rest: Partial<BoundLimit> = {}): BoundLimit => ({
    field,
    name: field,
    unit: 'mm',
    text: { metric: '', inch: '' },
    ...rest,
  });

  it('fill the ends they have, with their unit', () => {
    expect(filledBy(fields, [limit('clearance', { min: 0.02, max: 0.06 })])).toEqual({
      'clearance.min': '0.02 mm',
      'clearance.max': '0.06 mm',
    });
    expect(filledBy(fields, [limit('clearance', { max: 2, unit: 'thou' })])).toEqual({ 'clearance.max': '2 thou' });
  });

  it('put a nominal value where the field says that it belongs', () => {
    expect(filledBy(fields, [limit('diameter', { nominal: 80, min: 79.98 })])).toEqual({
      'diameter.min': '79.98 mm',
      bore: '80 mm',
    });
  });

  it('are gathered where a sheet has one for each engine', () => {
    const all = byField([
      limit('clearance', { name: 'T18F' }),
      limit('diameter'),
      limit('clearance', { name: 'T24D' }),
    ]);
    expect(all.get('clearance')?.map(({ name }) => name)).toEqual(['T18F', 'T24D']);
  });
});
