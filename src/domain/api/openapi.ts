import { capital } from '../wording';
import { z } from 'zod';
import { zodToJsonSchema } from 'zod-to-json-schema';
import type { Operation } from './operation';
import { OPERATIONS } from './operations/all';
import * as book from './schemas/book';
import * as bulletins from './schemas/bulletins';
import * as check from './schemas/check';
import * as common from './schemas/common';
import * as compare from './schemas/compare';
import * as history from './schemas/history';
import * as imports from './schemas/imports';
import * as me from './schemas/me';
import * as merge from './schemas/merge';
import * as photos from './schemas/photos';
import * as proposals from './schemas/proposals';
import * as search from './schemas/search';
import * as threads from './schemas/threads';
import * as versions from './schemas/versions';

/** What each refusal means; the key is the status. */
const REFUSALS: Record<number, string> = {
  400: 'The body is not JSON',
  401: 'Signed out',
  403: 'Visible, but not yours to do; or asked for by another site',
  404: 'Unknown, or not yours to see; the two are not told apart',
  409: 'It has changed meanwhile, or its state does not allow this; nothing was lost',
  413: 'The body is larger than 100 KB, or a photo than 15 MB',
  415: 'The body is not of the declared kind, or a file of no kind that is taken',
  422: 'The values are not usable; `errors` says which and why',
  428: 'If-Match is missing',
  429: 'Too many calls; wait as long as Retry-After says',
  503: 'The storage is busy, full or out of reach; nothing was half-written',
};

const isEmpty = (schema: z.ZodTypeAny) => schema instanceof z.ZodUndefined;

/** Named schemas: those that `schemas/` exports, by name, then what single calls take and answer beyond them. */
function names(): Map<z.ZodTypeAny, string> {
  const named = new Map<z.ZodTypeAny, string>();
  const areas = [
    book,
    bulletins,
    check,
    common,
    compare,
    history,
    imports,
    me,
    merge,
    photos,
    proposals,
    search,
    threads,
    versions,
  ];
  const exported = areas.flatMap((area) => Object.entries(area));
  // By code unit, so that the document does not depend on which file holds what.
  exported.sort(([a], [b]) => (a < b ? -1 : 1));
  for (const [name, schema] of exported) if (schema instanceof z.ZodType) named.set(schema, name);
  for (const { id, body, reply } of OPERATIONS) {
    if (!isEmpty(body) && !named.has(body)) named.set(body, `${capital(id)}Body`);
    if (!isEmpty(reply) && !named.has(reply)) named.set(reply, `${capital(id)}Reply`);
  }
  return named;
}

/** JSON Schema 2020-12, which OpenAPI 3.1 uses, writes a tuple as `prefixItems`. */
function tupleAsPrefix(schema: Record<string, unknown>): Record<string, unknown> {
  if (!Array.isArray(schema.items)) return schema;
  const { items, ...rest } = schema;
  return { ...rest, prefixItems: items };
}

const SHARED = {
  target: 'jsonSchema2019-09',
  basePath: ['#'],
  definitionPath: 'components/schemas',
  postProcess: (schema: unknown) => (schema ? tupleAsPrefix(schema as Record<string, unknown>) : schema),
} as const;

function jsonSchema(schema: z.ZodTypeAny, options: object): Record<string, unknown> {
  const { $schema: _, ...rest } = zodToJsonSchema(schema, { ...SHARED, ...options } as never) as Record<
    string,
    unknown
  >;
  return rest;
}

function parameters({ params, query, ifMatch, tag, method }: Operation) {
  const shapes: [string, z.ZodTypeAny][] = [
    ['path', params],
    ['query', query],
  ];
  const listed = shapes.flatMap(([where, schema]) =>
    schema instanceof z.ZodObject
      ? Object.entries(schema.shape as Record<string, z.ZodTypeAny>).map(([name, field]) => ({
          name,
          in: where,
          required: !field.isOptional(),
          ...(field.description ? { description: field.description } : {}),
          schema: jsonSchema(field, { $refStrategy: 'none' }),
        }))
      : [],
  );
  const header = (name: string, description: string, required = false) => ({
    name,
    in: 'header',
    required,
    description,
    schema: { type: 'string' },
  });
  if (ifMatch !== 'ignored')
    listed.push(header('If-Match', 'The version that the change is based on, for example "3"', ifMatch === 'required'));
  if (tag === 'content') listed.push(header('If-None-Match', 'Answers 304 where nothing changed'));
  if (method !== 'get')
    listed.push(header('Idempotency-Key', 'The same key with the same call answers what it first answered, for a day'));
  return listed;
}

/** Statuses a call may refuse with, from its shape and from what it lists itself. */
function refusals(op: Operation): number[] {
  const changes = op.method !== 'get';
  const hasQuery = op.query instanceof z.ZodObject && Object.keys(op.query.shape).length > 0;
  return [
    ...new Set([
      401,
      429,
      503,
      ...(changes ? [403] : []),
      ...(op.path.includes('{') ? [404] : []),
      ...(isEmpty(op.body) ? [] : [400, 413, 415, 422]),
      ...(hasQuery ? [422] : []),
      ...(op.ifMatch === 'ignored' ? [] : [409]),
      ...(op.ifMatch === 'required' ? [428] : []),
      ...op.refuses,
    ]),
  ].sort();
}

/** A file beside its fields. OpenAPI 3.1 describes it by the media types that it may have. */
const withFile = (file: string, fields: object) => ({
  'multipart/form-data': {
    schema: { allOf: [fields, { type: 'object', required: [file], properties: { [file]: {} } }] },
    encoding: { [file]: { contentType: 'image/jpeg, image/png, image/webp, image/avif' } },
  },
});

/** A form with a file: the file is the field of that name, in bytes. */
function formOf({ form }: Operation) {
  if (!form) return {};
  const { properties, ...schema } = jsonSchema(form, { $refStrategy: 'none' });
  const file = { type: 'string', format: 'binary' };
  return { 'multipart/form-data': { schema: { ...schema, properties: { ...(properties as object), file } } } };
}

function describe(op: Operation, refOf: (schema: z.ZodTypeAny) => object) {
  const json = (schema: z.ZodTypeAny) => ({ 'application/json': { schema: refOf(schema) } });
  const success = {
    description: op.summary,
    ...(op.tag !== 'none' ? { headers: { ETag: { schema: { type: 'string' } } } } : {}),
    ...(isEmpty(op.reply) ? {} : { content: json(op.reply) }),
  };
  const refused = refusals(op).map((status) => [
    String(status),
    {
      description: REFUSALS[status] ?? 'Refused',
      content: { 'application/problem+json': { schema: refOf(common.Problem) } },
    },
  ]);
  return {
    operationId: op.id,
    tags: [op.area],
    summary: op.summary,
    ...(op.description ? { description: op.description } : {}),
    parameters: parameters(op),
    ...(isEmpty(op.body)
      ? {}
      : {
          requestBody: {
            required: true,
            content: op.file === null ? { ...json(op.body), ...formOf(op) } : withFile(op.file, refOf(op.body)),
          },
        }),
    responses: {
      [op.status]: success,
      ...(op.tag === 'content' ? { 304: { description: 'Nothing changed' } } : {}),
      ...Object.fromEntries(refused),
    },
  };
}

/** The whole API as an OpenAPI 3.1 document, made from the same schemas that the routes validate with. */
export function openApiDocument(version: string) {
  const named = names();
  const definitions = Object.fromEntries([...named].map(([schema, name]) => [name, schema]));
  const whole = jsonSchema(z.object({}), { definitions });
  const refOf = (schema: z.ZodTypeAny) => ({ $ref: `#/components/schemas/${named.get(schema) ?? ''}` });
  const paths: Record<string, Record<string, unknown>> = {};
  for (const op of OPERATIONS) (paths[op.path] ??= {})[op.method] = describe(op, refOf);
  return {
    openapi: '3.1.0',
    info: {
      title: 'Matchmark',
      version,
      description:
        'Sign in with the session cookie: GET /api/auth/csrf, then POST /api/auth/callback/credentials with csrfToken, email and password. Errors are RFC 9457 problem documents.',
    },
    servers: [{ url: '/api/v1' }],
    security: [{ session: [] }],
    paths,
    components: {
      schemas: whole['components/schemas'],
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'matchmark.session' } },
    },
  };
}
