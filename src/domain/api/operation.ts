import { z } from 'zod';

export const METHODS = ['get', 'post', 'put', 'patch', 'delete'] as const;
export type Method = (typeof METHODS)[number];

/**
 * One call of the API: what it is called, what it takes and what it answers. The route validates with
 * it, the OpenAPI document is made from it, so the two cannot disagree.
 */
export interface Operation<
  Params extends z.ZodTypeAny = z.ZodTypeAny,
  Query extends z.ZodTypeAny = z.ZodTypeAny,
  Body extends z.ZodTypeAny = z.ZodTypeAny,
  Reply extends z.ZodTypeAny = z.ZodTypeAny,
> {
  /** Unique name, for example `readProposal`. */
  id: string;
  method: Method;
  /** Below `/api/v1`, parameters in braces: `/proposals/{id}`. */
  path: string;
  area: 'You' | 'Book' | 'Proposals' | 'Review' | 'Search' | 'Measures' | 'Shop';
  summary: string;
  description?: string;
  params: Params;
  query: Query;
  /** `z.undefined()` where the call takes no body. */
  body: Body;
  /** Name of the field that holds a file, for a call that takes `multipart/form-data`; null for JSON. */
  file: string | null;
  /** What a form with a file carries, where the call takes one instead of JSON. The route reads it itself. */
  form: z.ZodTypeAny | null;
  /** Status of success; 204 answers nothing. */
  status: 200 | 201 | 204;
  reply: Reply;
  /** What the ETag of the answer stands for: the version that `If-Match` names, or the whole content, which can be 304. */
  tag: 'none' | 'version' | 'content';
  /** Whether the call looks at `If-Match`, and whether it insists on it. */
  ifMatch: 'ignored' | 'accepted' | 'required';
  /** Statuses it may refuse with beyond those that follow from its shape. */
  refuses: readonly number[];
}

const Nothing = z.object({});

interface Given<P, Q, B, R> extends Pick<Operation, 'id' | 'method' | 'path' | 'area' | 'summary'> {
  description?: string;
  params?: P;
  query?: Q;
  body?: B;
  file?: string;
  form?: z.ZodTypeAny;
  status?: Operation['status'];
  reply?: R;
  tag?: Operation['tag'];
  ifMatch?: Operation['ifMatch'];
  refuses?: readonly number[];
}

/** Describes one call; what is left out is nothing, and success is 200, or 204 without a reply. */
export function operation<
  P extends z.ZodTypeAny = typeof Nothing,
  Q extends z.ZodTypeAny = typeof Nothing,
  B extends z.ZodTypeAny = z.ZodUndefined,
  R extends z.ZodTypeAny = z.ZodUndefined,
>(given: Given<P, Q, B, R>): Operation<P, Q, B, R> {
  return {
    status: given.reply ? 200 : 204,
    tag: 'none',
    ifMatch: 'ignored',
    refuses: [],
    file: null,
    form: null,
    ...given,
    params: given.params ?? (Nothing as unknown as P),
    query: given.query ?? (Nothing as unknown as Q),
    body: given.body ?? (z.undefined() as unknown as B),
    reply: given.reply ?? (z.undefined() as unknown as R),
  };
}
