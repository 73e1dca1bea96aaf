import { z } from 'zod';
import { ROLES } from '../../people/may';
import { Id, UnitSystem } from './common';

/** Who somebody is, and what they may change of it. The OpenAPI document is made from these schemas. */

export const Me = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  units: UnitSystem,
  shortcuts: z.boolean().describe('Single keys, such as / for search, act as shortcuts'),
  shop: z.object({ id: z.string(), name: z.string() }).nullable().describe('The shop the person works in now'),
  roles: z.array(
    z.object({
      in: z.enum(['shop', 'common', 'network']),
      shopId: z.string().nullable(),
      name: z.string(),
      role: z.enum(ROLES),
    }),
  ),
});
export type Me = z.infer<typeof Me>;

export const UpdateMe = z
  .object({
    name: z.string().trim().min(1, 'must not be empty').max(80, 'must be 80 characters or fewer'),
    units: UnitSystem,
    shortcuts: z.boolean(),
  })
  .partial();

export const ChangePassword = z.object({ current: z.string().max(200), next: z.string().max(200) });
