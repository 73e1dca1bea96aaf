import { spawn } from 'node:child_process';
import { build, install, root } from './steps.mjs';

/**
 * From a fresh clone to a running Matchmark: installs the locked packages, builds, serves. The server
 * itself makes the data folder and the secret, migrates and loads the book at its first start. Run again,
 * it starts in seconds and keeps all data.
 */

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
if (major < 20 || (major === 20 && minor < 12)) {
  console.error(`Matchmark needs Node 20.12 or newer; this is ${process.version}.`);
  process.exit(1);
}

await install();
const built = await build();
if (built !== 0) process.exit(built);

const env = { ...process.env, DEMO: process.env.DEMO ?? '1', NODE_ENV: 'production' };
const port = env.PORT ?? '4321';
const server = spawn(process.execPath, ['server.mjs'], { cwd: root, env, stdio: 'inherit' });
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code) => process.exit(code ?? 1));

const host = env.HOST && !['0.0.0.0', '::'].includes(env.HOST) ? env.HOST : '127.0.0.1';
const probe = `http://${host}:${port}/readyz`;
const publicHost = env.APP_ORIGIN ? { host: new URL(env.APP_ORIGIN).host } : {};
for (let tries = 0; tries < 300; tries++) {
  const ready = await fetch(probe, { headers: publicHost })
    .then((r) => r.ok)
    .catch(() => false);
  if (ready) break;
  await new Promise((resolve) => setTimeout(resolve, 200));
}

console.log(`
Open ${env.APP_ORIGIN || `http://localhost:${port}`}`);
if (env.DEMO === '1')
  console.log(`
The demonstration network is loaded. Every person signs in with the password matchmark-demo, or with one press on the page:
  apprentice@northgate.example   technician@northgate.example   senior@northgate.example   owner@northgate.example
  senior@pierstreet.example      editor@pierstreet.example      owner@pierstreet.example
  apprentice@sawmill.example     editor@sawmill.example         owner@sawmill.example
  editor@halden.example          editor2@halden.example         steward@halden.example
Start with DEMO=0 for real shops, then run: npm run admin:create`);
