import { z } from 'zod';
import { operation } from '../operation';
import { Id } from '../schemas/common';

const RuleName = z
  .string()
  .max(120)
  .describe('Worksheet and field of a rule of thumb, for example injector-set.deviation');

const ShopQuery = z.object({ shop: Id.optional().describe('The shop I work in now, where left out') });

const ShopRule = z.object({
  name: RuleName,
  worksheet: z.string(),
  field: z.string(),
  label: z.string(),
  unit: z.string().nullable().describe('Of the values and bounds; null for a plain number'),
  usual: z.number().describe('Common practice, without a standard behind it'),
  set: z.number().nullable().describe('What the shop has set; null where the usual value stands'),
  setBy: z.object({ id: z.string(), name: z.string() }).nullable(),
  setAt: z.string().nullable(),
  above: z.number().optional().describe('Must be more than this'),
  least: z.number().optional(),
  most: z.number().optional(),
});

export const readShopRules = operation({
  id: 'readShopRules',
  method: 'get',
  path: '/shop/rules',
  area: 'Shop',
  summary: 'The rules of thumb of all worksheets, with what the shop has set',
  query: ShopQuery,
  reply: z.object({ shop: z.object({ id: z.string(), name: z.string() }), items: z.array(ShopRule) }),
  refuses: [404],
});

export const setShopRule = operation({
  id: 'setShopRule',
  method: 'put',
  path: '/shop/rules/{name}',
  area: 'Shop',
  summary: 'Set a rule of thumb for the shop, or go back to the usual value',
  description: 'For the owner of the shop and the network steward.',
  params: z.object({ name: RuleName }),
  query: ShopQuery,
  body: z
    .object({
      value: z
        .union([z.number(), z.string().max(60)])
        .nullable()
        .describe('A number in the unit of the rule, a text in any unit of the kind, null for the usual value'),
    })
    .strict(),
  reply: ShopRule,
});
