import { beforeEach } from 'vitest';
import { openTestBook } from '../../../setup/database';
import { makeNetwork, publishFirst, type Member, type Network } from './network';

/** A book of its own for each test, with the test network and P-0142 published in the common book. */
export function useNetwork() {
  let network: Network | undefined;
  beforeEach(async () => {
    await openTestBook();
    network = await makeNetwork();
    await publishFirst('P-0142');
  });
  return {
    who(name: string): Member {
      const found = network?.people[name];
      if (!found) throw new Error(`Nobody is called ${name}.`);
      return found;
    },
    shop: (name: 'north' | 'pier'): string => network?.[name] ?? '',
  };
}
