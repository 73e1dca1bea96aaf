import { cpSync } from 'node:fs';
import { join } from 'node:path';
import sqlite3 from 'sqlite3';
import { v7 } from 'uuid';
import { signIn, start } from './product';

const EDITOR = 'editor@halden.example';

const run = (db: sqlite3.Database, sql: string) =>
  new Promise<Record<string, string>[]>((resolve, reject) =>
    db.all<Record<string, string>>(sql, (error, rows) => (error ? reject(error) : resolve(rows))),
  );

/**
 * Fills a stopped book up to `count` waiting proposals of the common book: copies of those that wait already. Written
 * past the use cases, because 500 of them would take minutes; without agreements, which the audit trail would miss.
 */
async function fill(dataDir: string, count: number): Promise<void> {
  const db = new sqlite3.Database(join(dataDir, 'matchmark.sqlite'));
  const columns = (await run(db, 'PRAGMA table_info(revisions)')).map(({ name }) => name);
  const waiting = await run(
    db,
    `SELECT r.id FROM revisions r JOIN procedures p ON p.id = r.procedureId
     WHERE r.state = 'proposed' AND p.bookKind = 'common' ORDER BY r.id`,
  );
  if (waiting.length === 0) throw new Error('Nothing waits in the demonstration.');
  await run(db, 'BEGIN');
  for (let n = waiting.length; n < count; n += 1) {
    const from = waiting[n % waiting.length]?.['id'] ?? '';
    const to = v7();
    const values = columns.map((name) => (name === 'id' ? `'${to}'` : `"${name}"`));
    await run(
      db,
      `INSERT INTO revisions (${columns.map((name) => `"${name}"`).join(', ')})
       SELECT ${values.join(', ')} FROM revisions WHERE id = '${from}'`,
    );
  }
  await run(db, 'COMMIT');
  await new Promise<void>((resolve, reject) => db.close((error) => (error ? reject(error) : resolve())));
}

/** What an answer takes when nothing else of the machine is in its way. */
const quickTenth = (times: number[]) => times.sort((a, b) => a - b)[Math.floor(times.length / 10)] ?? NaN;

/**
 * How much longer the review desk takes to answer with 500 waiting proposals than with 5: the ratio of the
 * tenth quickest of 100 answers each, taken in turn, so that a busy machine slows both alike.
 */
export async function deskGrowth(work: string): Promise<{ few: number; many: number; ratio: number }> {
  const [few, many] = [join(work, 'desk-few'), join(work, 'desk-many')] as const;
  await (await start(few, 4394)).stop();
  cpSync(few, many, { recursive: true });
  await fill(few, 5);
  await fill(many, 500);
  const running = [await start(few, 4394), await start(many, 4395)] as const;
  const cookies = [await signIn(running[0].address, EDITOR), await signIn(running[1].address, EDITOR)] as const;
  const times: [number[], number[]] = [[], []];
  for (let i = 0; i < 130; i += 1)
    for (const side of [0, 1] as const) {
      const from = performance.now();
      const answer = await fetch(`${running[side].address}/review-desk`, { headers: { cookie: cookies[side] } });
      const body = await answer.text();
      if (answer.status !== 200 || !body.includes('Review desk'))
        throw new Error(`The desk answered ${answer.status}.`);
      if (i >= 30) times[side].push(performance.now() - from);
    }
  for (const one of running) await one.stop();
  const [a, b] = [quickTenth(times[0]), quickTenth(times[1])];
  return { few: a, many: b, ratio: b / a };
}
