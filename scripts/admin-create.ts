/**
 * Makes the first network steward: `npm run admin:create`, which asks, or
 * `npm run admin:create -- --name "…" --email … --password …`.
 */
import { stdin, stdout } from 'node:process';
import { createInterface } from 'node:readline/promises';
import { Writable } from 'node:stream';
import { text } from 'node:stream/consumers';
import { parseArgs } from 'node:util';
import { createFirstSteward } from '@/server/accounts/firstSteward';
import { readConfig } from '@/server/config';
import { useApp } from '@/server/context';
import { Refusal } from '@/server/refusal';
import { openBook } from '@/server/start';

const { values: given } = parseArgs({
  options: { name: { type: 'string' }, email: { type: 'string' }, password: { type: 'string' } },
});

// Answers may also be piped in, a line each.
const asked = !given.name || !given.email || !given.password;
const piped = asked && !stdin.isTTY ? (await text(stdin)).split('\n') : null;

async function ask(question: string, secret = false): Promise<string> {
  if (piped) return piped.shift() ?? '';
  if (secret) stdout.write(`${question}: `);
  // What is typed next may be a password: then the terminal shows none of it.
  const output = secret ? new Writable({ write: (_chunk, _encoding, done) => done() }) : stdout;
  const lines = createInterface({ input: stdin, output, terminal: true });
  const answer = await lines.question(secret ? '' : `${question}: `);
  lines.close();
  if (secret) stdout.write('\n');
  return answer;
}

const name = given.name ?? (await ask('Name'));
const email = given.email ?? (await ask('E-mail address'));
const password = given.password ?? (await ask('Password, 10 characters or more', true));

const running = await openBook(readConfig());
useApp(running);
try {
  await createFirstSteward({ name, email, password });
  console.log(`Made ${name} the steward of this network. Sign in with ${email}.`);
} catch (error) {
  if (!(error instanceof Refusal)) throw error;
  console.error([error.detail, ...(error.errors ?? []).map(({ path, message }) => `  ${path}: ${message}`)].join('\n'));
  process.exitCode = 1;
} finally {
  await running.db.close();
}
