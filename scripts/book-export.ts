/**
 * Writes the published book out of the database:
 *
 *   npm run book:export                            the common book, back to content/procedures
 *   npm run book:export -- ./elsewhere             the same, into another folder
 *   npm run book:export -- --git ./book            with its history, as a git repository (bare where the name ends in .git)
 *   npm run book:export -- --dita ./dita           each sheet in use as a DITA 1.2 task, its drawings beside it
 *
 * --shop <slug> takes one shop's own book instead of the common one (with --git and --dita).
 * --emails puts real e-mail addresses into the history; without it they lead nowhere.
 */
import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { exportBook } from '@/server/book/exportBook';
import { readConfig } from '@/server/config';
import { useApp } from '@/server/context';
import { CannotExport } from '@/server/export/git';
import { writeHistory } from '@/server/export/gitRepository';
import { shopBySlug } from '@/server/export/shops';
import { writeTasks } from '@/server/export/tasks';
import { openBook } from '@/server/start';

function given() {
  try {
    return parseArgs({
      allowPositionals: true,
      options: {
        git: { type: 'string' },
        dita: { type: 'string' },
        shop: { type: 'string' },
        emails: { type: 'boolean', default: false },
      },
    });
  } catch (error) {
    throw new CannotExport(error instanceof Error ? error.message : String(error));
  }
}

const counted = (n: number, one: string): string => `${n} ${one}${n === 1 ? '' : 's'}`;

async function main(): Promise<void> {
  const { values, positionals } = given();
  const { git, dita, shop, emails } = values;
  if (git === undefined && dita === undefined && (shop !== undefined || emails))
    throw new CannotExport('--shop and --emails go with --git or --dita. Name one of them with a folder.');
  const config = readConfig();
  // Only opened, not brought up to date: a file that was edited here must not enter the book on the way out.
  const running = await openBook(config);
  useApp(running);
  try {
    const shopId = shop === undefined ? null : await shopBySlug(shop);
    if (git !== undefined) {
      const { commits, tip } = await writeHistory(resolve(git), { shopId, realAddresses: emails });
      console.log(`${counted(commits, 'commit')}, the last ${tip}`);
    }
    if (dita !== undefined) console.log(counted((await writeTasks(resolve(dita), shopId)).length, 'task'));
    if (git === undefined && dita === undefined) {
      const { written, unchanged } = await exportBook(positionals[0] ? resolve(positionals[0]) : config.contentDir);
      for (const name of written) console.log(`wrote ${name}`);
      console.log(`${written.length} written, ${unchanged.length} unchanged`);
    }
  } finally {
    await running.db.close();
  }
}

try {
  await main();
} catch (error) {
  if (!(error instanceof CannotExport)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
