/** Writes the published common book back to content/procedures, or to the folder named: `npm run book:export -- ./elsewhere`. */
import { resolve } from 'node:path';
import { exportBook } from '@/server/book/exportBook';
import { readConfig } from '@/server/config';
import { useApp } from '@/server/context';
import { openBook } from '@/server/start';

const config = readConfig();
// Only opened, not brought up to date: a file that was edited here must not enter the book on the way out.
const running = await openBook(config);
useApp(running);
try {
  const { written, unchanged } = await exportBook(process.argv[2] ? resolve(process.argv[2]) : config.contentDir);
  for (const name of written) console.log(`wrote ${name}`);
  console.log(`${written.length} written, ${unchanged.length} unchanged`);
} finally {
  await running.db.close();
}
