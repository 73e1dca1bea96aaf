import type { AuthConfig } from '@auth/core';

// Read by auth-astro. Its own types do not pass a strict check, so they are not imported here.
export default { prefix: '/api/auth', providers: [], secret: process.env.AUTH_SECRET ?? '' } satisfies AuthConfig & {
  prefix: string;
};
