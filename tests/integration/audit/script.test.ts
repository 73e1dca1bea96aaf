import { spawnSync } from 'node:child_process';
import { expect, it } from 'vitest';
import { app } from '@/server/context';
import { useNetwork } from '../api/support/useNetwork';

useNetwork();

async function check(...args: string[]) {
  const { config } = await app();
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'scripts/audit-check.ts', ...args],
    { encoding: 'utf8', env: { ...process.env, DATA_DIR: config.dataDir, DEMO: '0', NODE_ENV: 'production' } },
  );
  return { status, stdout, stderr };
}

it('the script ends with 0 where all holds, with 1 and the row where it does not, with 2 where it is asked wrongly', async () => {
  const whole = await check();
  expect(whole, whole.stderr).toMatchObject({ status: 0 });
  expect(whole.stdout).toMatch(/^1 entries and 1 texts checked in \d+\.\d s\.\nThe trail holds\./);
  const [, known] = /1:([0-9a-f]{64})/.exec(whole.stdout) ?? [];
  expect((await check('--expect', `1:${known!.slice(0, 8)}`)).status).toBe(0);
  expect((await check('--expect', `1:${known!.replace(/^./, (c) => (c === '0' ? '1' : '0'))}`)).status).toBe(1);
  expect((await check('--expect', 'all')).status).toBe(2);

  const { db } = await app();
  await db.sequelize.query('DROP TRIGGER revisions_published_text_stays');
  await db.sequelize.query(`UPDATE revisions SET source = source || ' '`);
  const broken = await check();
  expect(broken.status).toBe(1);
  expect(broken.stdout).toMatch(
    /^revisions [0-9a-f-]{36} \(P-0142 revision A\): P-0142 revision A has another text than the one that was stored/,
  );
}, 120_000);
