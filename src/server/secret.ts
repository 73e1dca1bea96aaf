import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** The key that signs sessions: made at the first start, read at each later one. 64 hex digits. */
export function readSecret(dataDir: string): string {
  mkdirSync(dataDir, { recursive: true });
  const file = join(dataDir, 'secret');
  try {
    // wx: of two processes that start together, one makes it and the other reads it.
    writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600, flag: 'wx' });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
  const secret = readFileSync(file, 'utf8').trim();
  if (!/^[0-9a-f]{64}$/.test(secret))
    throw new Error(`The file ${file} holds no secret. Delete it to make a new one; everybody is then signed out.`);
  return secret;
}
