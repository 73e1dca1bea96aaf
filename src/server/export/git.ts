import { spawn } from 'node:child_process';

/** What stops an export, for whoever runs it: what is wrong and what to do. */
export class CannotExport extends Error {
  override name = 'CannotExport';
}

const NO_GIT =
  'git was not found, so the history cannot be written. Install git, or export without --git for the book as it stands.';

interface Ran {
  code: number;
  out: string;
  err: string;
}

// Run from a hook of another repository, git would be told by GIT_DIR to write into that one.
const ownEnvironment = () =>
  Object.fromEntries(Object.entries(process.env).filter(([name]) => !name.startsWith('GIT_')));

/** Runs git and gives back what it said. Throws `CannotExport` where there is none. */
export function git(args: readonly string[], { input = '', cwd }: { input?: string; cwd?: string } = {}): Promise<Ran> {
  return new Promise((resolve, reject) => {
    const child = spawn('git', args, { cwd, env: ownEnvironment(), stdio: ['pipe', 'pipe', 'pipe'] });
    let out = '';
    let err = '';
    child.stdout.setEncoding('utf8').on('data', (part: string) => (out += part));
    child.stderr.setEncoding('utf8').on('data', (part: string) => (err += part));
    child.on('error', (error: NodeJS.ErrnoException) => {
      // A folder that is not there is ENOENT as well; it is made before git runs in it.
      reject(error.code === 'ENOENT' ? new CannotExport(NO_GIT) : error);
    });
    // A git that stops early closes its end; its own words say why.
    child.stdin.on('error', () => undefined);
    child.on('close', (code) => resolve({ code: code ?? 1, out, err }));
    child.stdin.end(input);
  });
}

/** The same, where anything but success stops the export. */
export async function mustGit(args: readonly string[], how: { input?: string; cwd?: string } = {}): Promise<string> {
  const { code, out, err } = await git(args, how);
  if (code !== 0) throw new CannotExport(`git ${args[0] ?? ''} failed: ${err.trim() || `it ended with ${code}`}`);
  return out;
}
