import { readShopRules } from '@/domain/api/operations/shop';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { ruleReply } from '@/server/measure/ruleReply';
import { readRules } from '@/server/measure/rules';

export const { GET, ALL } = route({
  GET: endpoint(readShopRules, async ({ actor, query }) => {
    const { shop, settings } = await readRules(actor, query.shop);
    return { body: { shop, items: settings.map(ruleReply) } };
  }),
});
