/** Writes the stream that `git fast-import` reads (git-fast-import(1), "Input format"). */

export interface Ident {
  name: string;
  email: string;
  /** ISO 8601 in UTC. */
  at: string;
}

export type FileChange = { kind: 'write'; path: string; content: string } | { kind: 'delete'; path: string };

export interface Commit {
  author: Ident;
  committer: Ident;
  message: string;
  changes: readonly FileChange[];
  /** Names of lightweight tags on this commit. */
  tags: readonly string[];
}

const bytes = new TextEncoder();

/** `data <n>` counts bytes of UTF-8, not characters. */
const data = (text: string): string => `data ${bytes.encode(text).length}\n${text}\n`;

// An identity ends at "<", ">" or a line end, and `git fsck` refuses one without a name.
const identName = (name: string): string =>
  name
    .replaceAll('<', '‹')
    .replaceAll('>', '›')
    .replace(/[\p{Cc}\p{Surrogate}]+/gu, ' ')
    .trim() || 'Nobody named';
const identEmail = (email: string): string => email.replace(/[\s<>\p{Cc}\p{Surrogate}]+/gu, '');

const seconds = (at: string): number => Math.floor(Date.parse(at) / 1000);

const ident = ({ name, email, at }: Ident): string => `${identName(name)} <${identEmail(email)}> ${seconds(at)} +0000`;

/** A path as the stream takes it: quoted as a C string where a line end, a quote or a backslash would mislead it. */
export function quotedPath(path: string): string {
  const parts = path.split('/');
  if (path.includes('\0') || parts.some((part) => ['', '.', '..'].includes(part)))
    throw new RangeError(`"${path}" is no path inside a repository.`);
  if (!/["\\\p{Cc}]/u.test(path)) return path;
  const escaped = path
    .replace(/["\\]/g, '\\$&')
    .replace(/\p{Cc}/gu, (c) => [...bytes.encode(c)].map((byte) => `\\${byte.toString(8).padStart(3, '0')}`).join(''));
  return `"${escaped}"`;
}

const change = (one: FileChange): string =>
  one.kind === 'delete'
    ? `D ${quotedPath(one.path)}\n`
    : `M 100644 inline ${quotedPath(one.path)}\n${data(one.content)}`;

// A commit object ends its message nowhere but at its end; a NUL in it is refused by `git fsck`.
const message = (text: string): string => data(text.replaceAll('\0', '\uFFFD').toWellFormed());

const commit = (one: Commit, mark: number, branch: string): string =>
  [
    `commit ${branch}\nmark :${mark}\n`,
    `author ${ident(one.author)}\ncommitter ${ident(one.committer)}\n`,
    message(one.message),
    mark > 1 ? `from :${mark - 1}\n` : '',
    ...one.changes.map(change),
    ...one.tags.map((tag) => `reset refs/tags/${tag}\nfrom :${mark}\n\n`),
  ].join('');

/**
 * The whole history of a branch, oldest commit first. The same commits make the same stream, and so the same ids.
 * `done` at the end tells git that nothing was cut off (run it with `--done`).
 */
export function fastImportStream(commits: readonly Commit[], branch = 'refs/heads/main'): string {
  return `${commits.map((one, i) => commit(one, i + 1, branch)).join('')}done\n`;
}
