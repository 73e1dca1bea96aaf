import { execFile, spawn } from 'node:child_process';
import { rm } from 'node:fs/promises';
import { promisify } from 'node:util';
import { expect } from '@playwright/test';

export interface OwnServer {
  origin: string;
  stop: () => Promise<void>;
}

const environment = (port: number, dataDir: string, demo: '0' | '1' | '') => ({
  ...process.env,
  PORT: String(port),
  HOST: '127.0.0.1',
  DATA_DIR: dataDir,
  DEMO: demo,
  NODE_ENV: 'production',
  APP_ORIGIN: '',
});

/** Runs a script of the product on a data folder, as an operator does. */
export const runScript = (script: string, args: readonly string[], dataDir: string) =>
  promisify(execFile)(process.execPath, ['--import', 'tsx', script, ...args], { env: environment(0, dataDir, '') });

/** Empties a folder below `data/`. */
export const emptyFolder = (dataDir: string) => rm(dataDir, { recursive: true, force: true });

/** Starts the built product beside the one that most tests share, and waits until it is ready. */
export async function startServer(port: number, dataDir: string, demo: '0' | '1' | ''): Promise<OwnServer> {
  const child = spawn(process.execPath, ['server.mjs'], { env: environment(port, dataDir, demo), stdio: 'inherit' });
  const ended = new Promise<void>((done) => child.once('exit', () => done()));
  const origin = `http://localhost:${port}`;
  await expect
    .poll(async () => (await fetch(`${origin}/readyz`).catch(() => null))?.status, { timeout: 50_000 })
    .toBe(200);
  return {
    origin,
    stop: async () => {
      child.kill('SIGTERM');
      await ended;
    },
  };
}
