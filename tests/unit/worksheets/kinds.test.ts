import { expect, it } from 'vitest';
import { WORKSHEETS as KINDS } from '@/domain/procedure/worksheets';
import { WORKSHEETS } from '@/domain/worksheets/registry';

it('is called on a sheet what it is called in the handbook', () => {
  const onSheets: Record<string, string> = KINDS;
  for (const { name, title } of WORKSHEETS) expect(onSheets[name], name).toBe(title);
});
