import { z } from 'zod';

/** What many calls share. Dates are ISO 8601 in UTC. The OpenAPI document is made from these schemas. */

export const Id = z.string().uuid().describe('UUIDv7');

export const ProcedureNumber = z
  .string()
  .regex(/^P-\d{4,6}$/)
  .describe('For example P-0142');

export const RevisionLetter = z
  .string()
  .regex(/^[A-HJ-NPRT-WY]{1,2}$/)
  .describe('By ASME Y14.35, for example C');

export const Problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    detail: z.string(),
    errors: z
      .array(
        z.object({ path: z.string(), message: z.string(), line: z.number().optional(), column: z.number().optional() }),
      )
      .optional(),
  })
  .passthrough()
  .describe('RFC 9457 problem document');
export type Problem = z.infer<typeof Problem>;

export const BookRef = z.object({
  kind: z.enum(['common', 'shop']),
  shopId: z.string().nullable(),
  name: z.string().describe('"Common book" or the name of the shop'),
});
export type BookRef = z.infer<typeof BookRef>;

export const UnitSystem = z.enum(['metric', 'inch']);
export type UnitSystem = z.infer<typeof UnitSystem>;

export const PersonRef = z.object({ id: z.string(), name: z.string(), shop: z.string().nullable() });
export type PersonRef = z.infer<typeof PersonRef>;

/** Lists answer `{items, next}`; `next` is the `cursor` of the following page, null on the last. */
export const ListQuery = z.object({
  cursor: z.string().max(100).optional().describe('`next` of the page before'),
  limit: z.coerce.number().int('must be a whole number').min(1).max(200).default(50),
});
export type ListQuery = z.infer<typeof ListQuery>;

export const pageOf = <T extends z.ZodTypeAny>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable() });

export type Page<T> = { items: T[]; next: string | null };
