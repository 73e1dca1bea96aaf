import { app } from '../context';
import { hashPassword, LONGEST_PASSWORD, verifyPassword } from './passwords';
import { countTry } from './tries';

/** Who signed in, and the version their session token must carry. */
export interface SignedIn {
  personId: string;
  tokenVersion: number;
}

interface Account {
  id: string;
  tokenVersion: number;
  passwordHash: string;
}

let decoy: Promise<string> | undefined;

/**
 * The person whose e-mail and password these are, or null. Throws 429 after too many wrong ones.
 * People of the demonstration are unknown to a server that does not run it.
 */
export async function checkSignIn(email: string, password: string): Promise<SignedIn | null> {
  const { db, config } = await app();
  const tried = await countTry(email);
  if (password.length > LONGEST_PASSWORD) return null;
  const [account] = await db.read<Account>(
    `SELECT id, tokenVersion, passwordHash FROM people
     WHERE email = :email AND kind = 'person' AND passwordHash IS NOT NULL AND (demonstration = 0 OR :demo)`,
    { email: email.trim(), demo: config.demo },
  );
  // An unknown e-mail takes as long as a wrong password, so that the wait does not tell who has an account.
  const stored = account?.passwordHash ?? (await (decoy ??= hashPassword('nobody signs in with this')));
  const right = await verifyPassword(stored, password);
  if (!account || !right) return null;
  await tried.right();
  return { personId: account.id, tokenVersion: account.tokenVersion };
}
