import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** What `up` and `verify` share. Plain Node: nothing here may need an installed package. */

export const root = dirname(dirname(fileURLToPath(import.meta.url)));

/** Runs a command in the project's folder; resolves to its exit code and, where asked, what it printed. */
export function run(command, args, { env = {}, quiet = false } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd: root,
      env: { ...process.env, ...env },
      stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit'],
    });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** SHA-256 over the names and bytes of files and folders below the project's root. */
export function fingerprint(paths) {
  const hash = createHash('sha256');
  const visit = (path) => {
    const full = join(root, path);
    if (!existsSync(full)) return;
    if (statSync(full).isDirectory()) {
      for (const name of readdirSync(full).sort()) visit(join(path, name));
      return;
    }
    hash.update(path).update('\0').update(readFileSync(full)).update('\0');
  };
  paths.forEach(visit);
  return hash.digest('hex');
}

const mark = (file) => (existsSync(file) ? readFileSync(file, 'utf8') : '');

/** Installs the locked packages, unless exactly these are installed already. */
export async function install() {
  const stamp = join(root, 'node_modules/.installed-for');
  const wanted = fingerprint(['package-lock.json']);
  if (mark(stamp) === wanted) return;
  console.log('Installing the locked packages. This takes a few minutes the first time.');
  const { code } = await run('npm', ['ci', '--no-audit', '--no-fund']);
  if (code !== 0) {
    console.error(
      'The packages could not be installed. sqlite3 may have to be compiled: that needs python3, make and g++.',
    );
    process.exit(code);
  }
  writeFileSync(stamp, wanted);
}

const BUILT_FROM = [
  'src',
  'db',
  'public',
  'content',
  'astro.config.mjs',
  'auth.config.ts',
  'tailwind.config.cjs',
  'tsconfig.json',
  'package-lock.json',
];

/** Builds, unless the build there is was made from exactly these sources. */
export async function build() {
  const stamp = join(root, 'dist/.built-from');
  const wanted = fingerprint(BUILT_FROM);
  if (mark(stamp) === wanted) return 0;
  console.log('Building.');
  const { code } = await run('npm', ['run', '--silent', 'build']);
  if (code === 0) writeFileSync(stamp, wanted);
  return code;
}
