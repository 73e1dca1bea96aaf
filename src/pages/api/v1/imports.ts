import { importHowTo } from '@/domain/api/operations/imports';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { importSent, importText } from '@/server/imports/importHowTo';

export const { POST, ALL } = route({
  POST: endpoint(importHowTo, async ({ actor, body, context }) => ({
    // A form with a file is not read yet.
    body: body
      ? await importText(actor, body.book, body.markdown)
      : (await importSent(actor, context.request)).imported,
  })),
});
