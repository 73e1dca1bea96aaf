import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { changed, SAMPLE } from '../../unit/procedure/sample';

const folder = mkdtempSync(join(tmpdir(), 'matchmark-format-'));
afterAll(() => rmSync(folder, { recursive: true }));

function format(source: string, ...options: string[]) {
  const file = join(folder, 'p-0001-sample.mdx');
  writeFileSync(file, source);
  const { status, stdout } = spawnSync('node', ['--import', 'tsx', 'scripts/book-format.ts', file, ...options], {
    encoding: 'utf8',
  });
  return { status, stdout, text: readFileSync(file, 'utf8') };
}

describe('npm run book:format', () => {
  const loose = changed('minutes: 70\nskill: apprentice', 'skill: apprentice\nminutes: 70');

  it('writes a text in canonical form', () => {
    expect(format(loose)).toMatchObject({ status: 0, text: SAMPLE });
  });

  it('with --check names what is not in that form, and leaves it', () => {
    const { status, stdout, text } = format(loose, '--check');
    expect(status).toBe(1);
    expect(stdout).toMatch(/p-0001-sample\.mdx:1:1: error: Not in canonical form\. Run npm run book:format\./);
    expect(text).toBe(loose);
    expect(format(SAMPLE, '--check').status).toBe(0);
  });

  it('names errors at their line and column, and leaves the file', () => {
    const broken = changed('nm: 10\n', 'nm: ten\n');
    const { status, stdout, text } = format(broken);
    expect(status).toBe(1);
    expect(stdout).toMatch(/p-0001-sample\.mdx:28:9: error: Torque 1 \(Cover bolt\): torque in N·m must be a number/);
    expect(text).toBe(broken);
  });
}, 60_000);
