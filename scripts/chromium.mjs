import { existsSync } from 'node:fs';
import { run } from './steps.mjs';

/** Path of a Chromium for the browser tests: CHROMIUM_PATH, then Debian's; installed where that is allowed. */
export async function findChromium() {
  const candidates = [
    process.env.CHROMIUM_PATH,
    '/usr/bin/chromium',
    '/usr/bin/chromium-browser',
    '/usr/bin/google-chrome',
  ];
  const found = () => candidates.find((path) => path && existsSync(path));
  if (found()) return found();
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    console.log('Installing Chromium for the browser tests.');
    const env = { DEBIAN_FRONTEND: 'noninteractive' };
    await run('apt-get', ['update', '-qq'], { env, quiet: true });
    await run('apt-get', ['install', '-y', '-qq', 'chromium'], { env, quiet: true });
  }
  if (found()) return found();
  console.error('No Chromium found. Install it (Debian: apt-get install chromium) or set CHROMIUM_PATH.');
  return undefined;
}
