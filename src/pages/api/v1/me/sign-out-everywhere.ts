import { signOutEverywhere } from '@/domain/api/operations/me';
import { signOutEverywhere as signOut } from '@/server/accounts/profile';
import { FORGET_PAGES } from '@/server/front/headers';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(signOutEverywhere, async ({ actor }) => {
    await signOut(actor);
    return { body: undefined, headers: FORGET_PAGES };
  }),
});
