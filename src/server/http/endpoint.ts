import { randomUUID } from 'node:crypto';
import type { APIContext } from 'astro';
import type { z } from 'zod';
import type { Operation } from '@/domain/api/operation';
import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { asRefusal, forbidden, invalid, notFound, preconditionRequired, signedOut } from '../refusal';
import { idempotencyKey, once, requestPrint, type Answer } from './idempotency';
import { comesFromUs } from './origin';
import { alreadyHeld, expectedVersion } from './preconditions';
import { problemResponse } from './problem';
import { countCall } from './rateLimit';
import { NOTHING_SENT, readBody, type SentBody } from './sentBody';
import { isMultipart } from './multipart';
import { fieldErrors } from './fieldErrors';

/** What a route is given: everything checked against its operation. */
export interface Call<P extends z.ZodTypeAny, Q extends z.ZodTypeAny, B extends z.ZodTypeAny> {
  actor: Actor;
  params: z.output<P>;
  query: z.output<Q>;
  body: z.output<B>;
  /** Path of the temporary file of a call that takes one, else empty. It is gone once the call is answered. */
  file: string;
  /** From `If-Match`; null where the caller did not say. */
  version: number | null;
  context: APIContext;
  /** Whether the caller already holds what this entity tag stands for. */
  holds: (tag: string) => boolean;
}

/** What a route answers; `NOT_MODIFIED` where the caller holds it already. */
export type Reply<R extends z.ZodTypeAny> =
  | { body: z.output<R>; tag?: string; location?: string; headers?: Record<string, string> }
  | { notModified: string }
  /** JSON that is kept as bytes, compressed already. */
  | { bytes: Uint8Array<ArrayBuffer>; encoding: string; tag: string };

/** What goes out: text, or bytes as they are. */
type Outgoing = Omit<Answer, 'body'> & { body: string | Uint8Array<ArrayBuffer> };

export type Handler = ((context: APIContext) => Promise<Response>) & { operation: Operation };

async function settle<P extends z.ZodTypeAny, Q extends z.ZodTypeAny, B extends z.ZodTypeAny, R extends z.ZodTypeAny>(
  operation: Operation<P, Q, B, R>,
  act: (call: Call<P, Q, B>) => Promise<Reply<R>>,
  context: APIContext,
): Promise<Outgoing> {
  const { request, url, locals } = context;
  const changing = operation.method !== 'get';
  const { config } = await app();
  if (changing && !comesFromUs(request, [url.origin, ...(config.origin ? [config.origin] : [])]))
    throw forbidden('This call came from a page of another site.');
  const { actor } = locals as { actor?: Actor };
  if (!actor?.personId) throw signedOut();
  await countCall(actor.personId, changing ? 'changing' : 'reading');
  if (operation.file !== null) await countCall(actor.personId, 'photos');

  const params = operation.params.safeParse(context.params);
  if (!params.success) throw notFound();
  const query = operation.query.safeParse(Object.fromEntries(url.searchParams));
  if (!query.success) throw invalid('The address asks for something that cannot be.', fieldErrors(query.error));
  // The route streams a form with a file itself, from `context.request`; `body` is then undefined.
  const isForm = operation.form !== null && isMultipart(request);
  const sent = isForm ? NOTHING_SENT : await readBody(operation, request);
  try {
    return await settled(operation, act, context, { actor, params: params.data, query: query.data, sent, isForm });
  } finally {
    await sent.dispose();
  }
}

/** The rest, once the body is there. */
async function settled<P extends z.ZodTypeAny, Q extends z.ZodTypeAny, B extends z.ZodTypeAny, R extends z.ZodTypeAny>(
  operation: Operation<P, Q, B, R>,
  act: (call: Call<P, Q, B>) => Promise<Reply<R>>,
  context: APIContext,
  { actor, sent, isForm, ...given }: { actor: Actor; params: unknown; query: unknown; sent: SentBody; isForm: boolean },
): Promise<Outgoing> {
  const { request, url } = context;
  const { secret } = await app();
  const body = isForm ? { success: true as const, data: undefined } : operation.body.safeParse(sent.value);
  if (!body.success) throw invalid('Some fields cannot be accepted.', fieldErrors(body.error));
  const version = expectedVersion(request.headers);
  if (operation.ifMatch === 'required' && !request.headers.has('if-match'))
    throw preconditionRequired('Send If-Match with the version that you read, for example If-Match: "3".');

  const answer = async (): Promise<Outgoing> =>
    render(
      operation,
      await act({
        actor,
        params: given.params as z.output<P>,
        query: given.query as z.output<Q>,
        body: body.data as z.output<B>,
        file: sent.file,
        version,
        context,
        holds: (tag) => alreadyHeld(request.headers, tag),
      }),
    );
  const key = operation.method === 'get' || isForm ? null : idempotencyKey(request.headers);
  if (key === null) return answer();
  const { replayed, ...kept } = await once(
    actor.personId,
    key,
    requestPrint(secret, request.method, url.pathname, sent.print),
    async () => {
      const given = await answer();
      return { ...given, body: String(given.body) };
    },
  );
  return replayed ? { ...kept, headers: { ...kept.headers, 'idempotency-replayed': 'true' } } : kept;
}

function render<R extends z.ZodTypeAny>(
  operation: Operation<z.ZodTypeAny, z.ZodTypeAny, z.ZodTypeAny, R>,
  reply: Reply<R>,
): Outgoing {
  const shared = { 'cache-control': 'private, no-cache', vary: 'Cookie' };
  if ('notModified' in reply) return { status: 304, headers: { ...shared, etag: reply.notModified }, body: '' };
  if ('bytes' in reply) {
    const { bytes, encoding, tag } = reply;
    const coded: Record<string, string> = encoding === 'identity' ? {} : { 'content-encoding': encoding };
    return {
      status: operation.status,
      headers: { ...shared, vary: 'Cookie, Accept-Encoding', etag: tag, 'content-type': 'application/json', ...coded },
      body: bytes,
    };
  }
  const headers = {
    ...shared,
    ...(reply.tag ? { etag: reply.tag } : {}),
    ...(reply.location ? { location: reply.location } : {}),
    ...reply.headers,
  };
  if (operation.status === 204) return { status: 204, headers, body: '' };
  return {
    status: operation.status,
    headers: { ...headers, 'content-type': 'application/json' },
    body: JSON.stringify(reply.body),
  };
}

/**
 * Makes a route of an operation: who asks (401), from where (403), how often (429), the address (404, 422),
 * the body (400, 413, 415, 422), `If-Match` (428), `Idempotency-Key`; then `act`, and its refusals as problem
 * documents. A fault that is ours is logged once, with the id that the caller is told.
 */
export function endpoint<
  P extends z.ZodTypeAny,
  Q extends z.ZodTypeAny,
  B extends z.ZodTypeAny,
  R extends z.ZodTypeAny,
>(operation: Operation<P, Q, B, R>, act: (call: Call<P, Q, B>) => Promise<Reply<R>>): Handler {
  const handle = async (context: APIContext) => {
    const requestId = randomUUID();
    try {
      const { status, headers, body } = await settle(operation, act, context);
      const empty = status === 204 || status === 304;
      return new Response(empty ? null : body, { status, headers: { ...headers, 'x-request-id': requestId } });
    } catch (error) {
      const refusal = asRefusal(error);
      if (refusal.status >= 500)
        console.error(`${requestId} ${operation.id} ${refusal.status}`, refusal.cause ?? refusal);
      return problemResponse(refusal, requestId);
    }
  };
  return Object.assign(handle, { operation: operation as unknown as Operation });
}
