import type { APIContext } from 'astro';
import { METHODS } from '@/domain/api/operation';
import { Refusal } from '../refusal';
import type { Handler } from './endpoint';
import { problemResponse } from './problem';

type Verb = Uppercase<(typeof METHODS)[number]>;

/**
 * What a route file exports: its handlers, and `ALL` for every other method, which answers 405 with `Allow`.
 * Astro would answer those 404, and would give a HEAD to `ALL` instead of `GET`.
 */
export function route<H extends Partial<Record<Verb, Handler>>>(handlers: H) {
  const verbs = METHODS.map((method) => method.toUpperCase() as Verb).filter((verb) => handlers[verb]);
  const allow = [...verbs, ...(handlers.GET ? ['HEAD'] : []), 'OPTIONS'].join(', ');
  const ALL = async (context: APIContext): Promise<Response> => {
    const { method } = context.request;
    if (method === 'HEAD' && handlers.GET) return handlers.GET(context);
    if (method === 'OPTIONS') return new Response(null, { status: 204, headers: { allow } });
    const refusal = new Refusal(405, 'method', 'Not that way', `This address takes ${allow}.`, { headers: { allow } });
    return problemResponse(refusal, crypto.randomUUID());
  };
  return { ...handlers, ALL };
}
