import { changePassword } from '@/domain/api/operations/me';
import { changePassword as change } from '@/server/accounts/profile';
import { newSession } from '@/server/accounts/session';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';

export const { POST, ALL } = route({
  POST: endpoint(changePassword, async ({ actor, body, context }) => {
    const { name, value, options } = await newSession(await change(actor, body));
    context.cookies.set(name, value, options);
    return { body: undefined };
  }),
});
