import { readMe, updateMe } from '@/domain/api/operations/me';
import { saveProfile } from '@/server/accounts/profile';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { signedOut } from '@/server/refusal';

export const { GET, PATCH, ALL } = route({
  GET: endpoint(readMe, async ({ context }) => {
    if (!context.locals.person) throw signedOut();
    return { body: context.locals.person };
  }),
  PATCH: endpoint(updateMe, async ({ actor, body, context }) => {
    if (!context.locals.person) throw signedOut();
    await saveProfile(actor, body);
    return { body: { ...context.locals.person, ...body } };
  }),
});
