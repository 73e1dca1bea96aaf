import { join } from 'node:path';
import { openDatabase } from '@db/connect';
import { DEMONSTRATION_PASSWORD } from '@db/seeders/demonstration';
import { seedNetwork } from '@db/seeders/seedNetwork';
import { hashPassword } from './accounts/passwords';
import { now } from './clock';
import { readConfig, type Config } from './config';
import { openOnce, within, type App } from './context';
import { readSecret } from './secret';

/** Opens the book under `config.dataDir`: makes the secret, migrates, and brings the content in. */
export async function start(config: Config): Promise<App> {
  const secret = readSecret(config.dataDir);
  const db = await openDatabase(join(config.dataDir, 'matchmark.sqlite'), { now });
  const running: App = { config, db, secret };
  await within(running, async () => {
    if (config.demo) await seedNetwork(db, () => hashPassword(DEMONSTRATION_PASSWORD));
  });
  return running;
}

/** The running application, started by the first caller with the settings of the environment. */
export const startOnce = (): Promise<App> => openOnce(() => start(readConfig()));
