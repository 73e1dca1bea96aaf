import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { Engine } from '@/domain/procedure/engine';

const folder = 'content/engines';
const files = readdirSync(folder).filter((name) => name.endsWith('.yaml'));
const read = (file: string): Record<string, unknown> => parse(readFileSync(`${folder}/${file}`, 'utf8'));
const messages = (data: unknown) => Engine.safeParse(data).error?.issues.map((issue) => issue.message) ?? [];

describe('engines', () => {
  it('has the three engines of the demonstration network', () => {
    expect(files.sort()).toEqual(['brandreth-b3.yaml', 'tarn-t18f.yaml', 'tarn-t24d.yaml']);
  });

  it.each(files)('%s keeps the schema', (file) => {
    expect(messages(read(file))).toEqual([]);
  });

  it('refuses a displacement that bore and stroke cannot make', () => {
    expect(messages({ ...read('tarn-t18f.yaml'), stroke: 95 })).toEqual([
      'does not follow from bore, stroke and cylinders, which make 2.01 L',
    ]);
  });

  it('refuses a firing order that leaves a cylinder out', () => {
    expect(messages({ ...read('tarn-t18f.yaml'), firingOrder: [1, 3, 4, 4] })).toEqual([
      'must name each cylinder from 1 to 4 exactly once',
    ]);
  });

  it('refuses years that run backwards', () => {
    expect(messages({ ...read('brandreth-b3.yaml'), years: { from: 2012, to: 1998 } })).toEqual([
      'must not be before the first year',
    ]);
  });
});
