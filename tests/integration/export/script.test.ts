import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { app } from '@/server/context';
import { publishFirst } from '../api/support/network';
import { useNetwork } from '../api/support/useNetwork';

/** The command itself, on a book of its own. */
const { shop } = useNetwork();

async function run(args: string[], env: Record<string, string> = {}) {
  const { config } = await app();
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'scripts/book-export.ts', ...args],
    {
      env: { ...process.env, DATA_DIR: config.dataDir, CONTENT_DIR: config.contentDir, ...env },
      encoding: 'utf8',
    },
  );
  return { status, stdout: stdout.trim(), stderr: stderr.trim() };
}
const inBook = async (name: string) => join((await app()).config.dataDir, name);

describe('npm run book:export', () => {
  test('writes the history and the tasks, of the common book or of a shop', async () => {
    await publishFirst('P-0901', { shopId: shop('north') });
    const both = await run(['--git', await inBook('book.git'), '--dita', await inBook('dita')]);
    expect(both).toMatchObject({ status: 0, stderr: '' });
    expect(both.stdout).toMatch(/^1 commits?, the last [0-9a-f]{40}\n1 tasks?$/);
    const own = await run(['--git', await inBook('own'), '--shop', 'test-shop-north']);
    expect(own).toMatchObject({ status: 0, stderr: '' });
  });

  test('says in a sentence what it cannot do, and ends with 1', async () => {
    const sentences = {
      'There is no shop elsewhere. There are: test-shop-north, test-shop-pier.': await run([
        ...['--git', await inBook('book'), '--shop', 'elsewhere'],
      ]),
      '--shop and --emails go with --git or --dita. Name one of them with a folder.': await run(['--shop', 'x']),
      'git was not found, so the history cannot be written. Install git, or export without --git for the book as it stands.':
        await run(['--git', await inBook('book')], { PATH: '' }),
    };
    for (const [sentence, ran] of Object.entries(sentences))
      expect(ran).toEqual({ status: 1, stdout: '', stderr: sentence });
    expect((await run(['--nonsense'])).stderr).toMatch(/^Unknown option '--nonsense'/);
  });
}, 60_000);
