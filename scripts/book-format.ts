/**
 * npm run book:format: writes every procedure in content/procedures in its canonical form.
 * With --check nothing is written: files that are not in that form are listed, and the exit code is 1.
 * Files can be named; without names all are taken. Errors stop a file from being written, notices do not.
 */
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseProcedure } from '../src/domain/procedure/parse';
import type { SourceProblem } from '../src/domain/procedure/types';

const FOLDER = new URL('../content/procedures/', import.meta.url);
const NAME = /^p-\d{4,6}-[a-z0-9-]+\.mdx$/;

const options = process.argv.slice(2);
const isCheck = options.includes('--check');
const isQuiet = options.includes('--quiet');
const named = options.filter((option) => !option.startsWith('--'));
const files = named.length
  ? named
  : readdirSync(FOLDER)
      .filter((name) => name.endsWith('.mdx'))
      .sort()
      .map((name) => fileURLToPath(new URL(name, FOLDER)));

let broken = 0;
let changed = 0;
for (const file of files) {
  const shown = relative(process.cwd(), file);
  const tell = (kind: string, { line, column, message }: SourceProblem) =>
    console.log(`${shown}:${line}:${column}: ${kind}: ${message}`);
  const name = file.split('/').at(-1) ?? '';
  if (!named.length && !NAME.test(name)) {
    broken += 1;
    console.log(
      `${shown}:1:1: error: The file's name must be the number and the task, for example p-0142-valve-cover-reseal.mdx.`,
    );
  }
  const source = readFileSync(file, 'utf8');
  const parsed = parseProcedure(source);
  if (!parsed.ok) {
    broken += 1;
    for (const error of parsed.errors) tell('error', error);
    continue;
  }
  if (!isQuiet) for (const notice of parsed.notices) tell('notice', notice);
  if (parsed.canonical === source) continue;
  changed += 1;
  if (isCheck) console.log(`${shown}:1:1: error: Not in canonical form. Run npm run book:format.`);
  else {
    writeFileSync(file, parsed.canonical);
    console.log(`${shown}: written in canonical form`);
  }
}
const right = files.length - broken;
console.log(
  `${right} of ${files.length} procedures read without error; ${changed} ${isCheck ? 'not in' : 'put into'} canonical form.`,
);
process.exitCode = broken || (isCheck && changed) ? 1 : 0;
