import { readWorksheet, workWorksheet } from '@/domain/api/operations/worksheets';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { describeWorksheet, workWorksheet as work } from '@/server/measure/worksheets';

export const { GET, POST, ALL } = route({
  GET: endpoint(readWorksheet, ({ params }) => Promise.resolve({ body: describeWorksheet(params.name) })),
  POST: endpoint(workWorksheet, async ({ actor, params, body, context }) => {
    const { outcome, understood } = await work(actor, params.name, body);
    const { verdict, reasons, results } = outcome;
    const units = context.locals.person?.units ?? 'metric';
    return {
      body: {
        verdict,
        reasons: reasons.map((reason) => reason[units]),
        results: results.map(({ main: _, ...result }) => result),
        understood,
      },
    };
  }),
});
