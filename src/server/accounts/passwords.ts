import { hash, verify } from '@node-rs/argon2';
import { invalid } from '../refusal';

// OWASP Password Storage Cheat Sheet: 19 MiB, two passes, one lane at the least. Argon2id is the package's own choice.
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** PHC string to store. */
export const hashPassword = (password: string): Promise<string> => hash(password.normalize('NFC'), COST);

export const verifyPassword = (stored: string, password: string): Promise<boolean> =>
  verify(stored, password.normalize('NFC'));

/** Longer ones only cost the server time. */
export const LONGEST_PASSWORD = 200;
const SHORTEST_PASSWORD = 10;

/** Refuses a password that is too short to choose. Length is what counts; no rule on its characters (NIST SP 800-63B). */
export function assertGoodPassword(password: string, path: string): void {
  if ([...password].length < SHORTEST_PASSWORD)
    throw invalid('Choose a longer password.', [{ path, message: `Use ${SHORTEST_PASSWORD} characters or more.` }]);
  if (password.length > LONGEST_PASSWORD)
    throw invalid('Choose a shorter password.', [{ path, message: `Use ${LONGEST_PASSWORD} characters or fewer.` }]);
}
