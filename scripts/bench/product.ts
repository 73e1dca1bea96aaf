import { spawn, type ChildProcess } from 'node:child_process';
import { root } from '../steps.mjs';

/** The built product, started on a data folder; with the time from start to ready. */
export interface Running {
  address: string;
  readyMs: number;
  stop: () => Promise<void>;
}

export async function start(dataDir: string, port: number, env: Record<string, string> = {}): Promise<Running> {
  const from = performance.now();
  const child: ChildProcess = spawn(process.execPath, ['server.mjs'], {
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      HOST: '127.0.0.1',
      APP_ORIGIN: '',
      DEMO: '1',
      ...env,
      PORT: String(port),
      DATA_DIR: dataDir,
    },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  const address = `http://127.0.0.1:${port}`;
  // A measurement that fails must not leave a server behind it.
  process.once('exit', () => child.kill('SIGKILL'));
  for (;;) {
    if (child.exitCode !== null) throw new Error(`The server stopped with ${child.exitCode}.`);
    if (
      await fetch(`${address}/readyz`)
        .then((r) => r.ok)
        .catch(() => false)
    )
      break;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  return {
    address,
    readyMs: performance.now() - from,
    stop: () =>
      new Promise((resolve) => {
        child.once('exit', () => resolve());
        child.kill('SIGTERM');
      }),
  };
}

/** Signs in as a demonstration person; returns the Cookie header of the session. */
export async function signIn(address: string, email: string): Promise<string> {
  const csrf = await fetch(`${address}/api/auth/csrf`);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const jar = new Map<string, string>();
  const keep = (response: Response) => {
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';');
      jar.set(pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1));
    }
  };
  const cookie = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  keep(csrf);
  const answer = await fetch(`${address}/api/auth/callback/credentials`, {
    method: 'POST',
    redirect: 'manual',
    headers: { 'content-type': 'application/x-www-form-urlencoded', cookie: cookie(), origin: address },
    body: new URLSearchParams({ csrfToken, email, password: 'matchmark-demo' }),
  });
  keep(answer);
  if (![...jar.keys()].some((name) => name.includes('session')))
    throw new Error(`Could not sign in as ${email}: ${answer.status}`);
  return cookie();
}
