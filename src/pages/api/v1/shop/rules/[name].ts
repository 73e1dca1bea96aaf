import { setShopRule } from '@/domain/api/operations/shop';
import { endpoint } from '@/server/http/endpoint';
import { route } from '@/server/http/route';
import { ruleReply } from '@/server/measure/ruleReply';
import { setRule } from '@/server/measure/setRules';

export const { PUT, ALL } = route({
  PUT: endpoint(setShopRule, async ({ actor, params, query, body }) => ({
    body: ruleReply(await setRule(actor, params.name, body.value, query.shop)),
  })),
});
