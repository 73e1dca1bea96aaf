import { authConfig } from '@/server/accounts/authConfig';
import { readConfig } from '@/server/config';
import { readSecret } from '@/server/secret';

const config = readConfig();

// Read by auth-astro, which keeps it for the life of the process. Its own types do not pass a strict check,
// so they are not imported here.
export default authConfig(config, readSecret(config.dataDir));
