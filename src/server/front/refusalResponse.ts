import type { Problem } from '@/domain/api/schemas';
import type { Refusal } from '../refusal';

/** A refusal as the API gives it: an RFC 9457 problem document. */
export function refusalResponse(refusal: Refusal): Response {
  const { type, title, status, detail, errors, extra, headers } = refusal;
  const problem: Problem = { ...extra, type, title, status, detail, ...(errors?.length ? { errors } : {}) };
  return new Response(JSON.stringify(problem), {
    status,
    headers: { ...headers, 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store' },
  });
}
