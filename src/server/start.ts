import { join } from 'node:path';
import { openDatabase } from '@db/connect';
import { DEMONSTRATION_PASSWORD } from '@db/seeders/demonstration';
import { seedNetwork } from '@db/seeders/seedNetwork';
import { hashPassword } from './accounts/passwords';
import { checkAtStart } from './audit/atStart';
import { importContent, type Imported } from './book/importContent';
import { startParsing } from './book/parsing';
import { atTime, now } from './clock';
import { readConfig, type Config } from './config';
import { openOnce, within, type App } from './context';
import { daysAgo, FIRST_ISSUE, seedHistory } from './demo/seedHistory';
import { emptyUploads, sweepPhotos } from './photos/sweep';
import { judgeUnjudged } from './review/judgeUnjudged';
import { readSecret } from './secret';

/** Opens the book under `config.dataDir`, making it and its secret where they are missing; brings nothing in. */
export async function openBook(config: Config): Promise<App> {
  const secret = readSecret(config.dataDir);
  return { config, secret, db: await openDatabase(join(config.dataDir, 'matchmark.sqlite'), { now }) };
}

/** Opens the book and brings in what this release ships and, where asked for, the demonstration network. */
export async function start(config: Config): Promise<App> {
  startParsing();
  const running = await openBook(config);
  try {
    await within(running, async () => {
      await judgeUnjudged();
      await emptyUploads();
      await sweepPhotos();
      const { problems } = await importing(running);
      for (const { file, message } of problems) console.warn(`${file} was left out of the book. ${message}`);
      if (!config.demo) return;
      // Its people were there from the first issue, so what changed since is a change to them.
      await atTime(daysAgo(FIRST_ISSUE), () => seedNetwork(running.db, () => hashPassword(DEMONSTRATION_PASSWORD)));
      await seedHistory();
    });
  } catch (error) {
    await running.db.close();
    throw error;
  }
  return running;
}

/** The demonstration's book was issued a while ago, so that its history lies between then and today. */
async function importing({ config, db }: App): Promise<Imported> {
  const isNew = (await db.models.Procedure.count()) === 0;
  return config.demo && isNew ? atTime(daysAgo(FIRST_ISSUE), importContent) : importContent();
}

/**
 * The running application, started by the first caller with the settings of the environment. The audit trail is checked
 * from its first entry meanwhile; a trail that does not hold is told, and stops nobody.
 */
export const startOnce = (): Promise<App> =>
  openOnce(async () => {
    const running = await start(readConfig());
    void within(running, checkAtStart);
    return running;
  });
