import { mkdir, readdir } from 'node:fs/promises';
import { commitsOf } from '@/domain/export/git/bookHistory';
import { fastImportStream } from '@/domain/export/git/fastImport';
import { readBookEvents } from './bookEvents';
import { CannotExport, git, mustGit } from './git';

export interface WrittenHistory {
  commits: number;
  /** Id of the last commit. */
  tip: string;
}

const isBare = (folder: string): boolean => folder.endsWith('.git');

/** Makes the repository where there is none. Refuses a folder that holds something else. */
async function prepare(folder: string): Promise<void> {
  await mkdir(folder, { recursive: true });
  const inside = await git(['rev-parse', '--resolve-git-dir', isBare(folder) ? '.' : '.git'], { cwd: folder });
  if (inside.code === 0) return refuseChanged(folder);
  if ((await readdir(folder)).length > 0)
    throw new CannotExport(`${folder} is not empty and is no git repository. Name an empty or a new folder.`);
  await mustGit(['init', '--quiet', '--initial-branch=main', ...(isBare(folder) ? ['--bare'] : [])], { cwd: folder });
  // The texts are the book's to the byte, whatever the machine thinks of line ends.
  await mustGit(['config', 'core.autocrlf', 'false'], { cwd: folder });
}

async function refuseChanged(folder: string): Promise<void> {
  if (isBare(folder)) return;
  const changed = await mustGit(['status', '--porcelain'], { cwd: folder });
  if (changed.trim())
    throw new CannotExport(`${folder} holds changes that are not committed. Commit or remove them, then export again.`);
}

/** Somebody who has another branch before them keeps it as it is. */
const isOnMain = async (folder: string): Promise<boolean> =>
  (await git(['symbolic-ref', '--quiet', 'HEAD'], { cwd: folder })).out.trim() === 'refs/heads/main';

/**
 * Writes a book with its history into a git repository, or goes on with one that was written before: the same history
 * makes the same commit ids, so what is new is added on top. A branch that went its own way is left as it is.
 *
 * @param folder absolute; one that ends in `.git` becomes a bare repository
 * @throws CannotExport with a sentence for whoever runs it
 */
export async function writeHistory(
  folder: string,
  { shopId = null, realAddresses = false }: { shopId?: string | null; realAddresses?: boolean } = {},
): Promise<WrittenHistory> {
  await mustGit(['--version']);
  const commits = commitsOf(await readBookEvents(shopId), { realAddresses });
  if (commits.length === 0) throw new CannotExport('Nothing was published in this book yet, so there is no history.');
  await prepare(folder);
  const { code, err } = await git(['fast-import', '--quiet', '--done'], {
    cwd: folder,
    input: fastImportStream(commits),
  });
  if (/new tip .* does not contain/.test(err))
    throw new CannotExport(
      `${folder} has commits that the book does not know, so its branch was left as it is. Export into a new folder and merge there.`,
    );
  if (code !== 0) throw new CannotExport(`git fast-import failed: ${err.trim()}`);
  if (!isBare(folder) && (await isOnMain(folder)))
    await mustGit(['reset', '--quiet', '--hard', 'refs/heads/main'], { cwd: folder });
  return { commits: commits.length, tip: (await mustGit(['rev-parse', 'refs/heads/main'], { cwd: folder })).trim() };
}
