import type { Problem } from '@/domain/api/schemas/common';

/** The server said no, and why. */
export class Refused extends Error {
  override name = 'Refused';
  constructor(
    readonly status: number,
    readonly problem: Problem,
  ) {
    super(problem.detail);
  }
}

interface Ask {
  body?: unknown;
  /** The version that the change stands on, for `If-Match`. */
  version?: number;
  /** One key for each press of a button, so that a second press does not act twice. */
  key?: string;
  signal?: AbortSignal;
  /** Lets the request outlive the page. */
  keepalive?: boolean;
}

/** What a gateway may answer instead of us. */
const unreadable = (status: number): Problem => ({
  type: 'about:blank',
  title: 'No answer',
  status,
  detail: `The server answered ${status}. Try again in a moment.`,
});

/** Calls `/api/v1`. Throws `Refused` for a refusal; what `fetch` throws means that there is no network. */
export async function ask<T>(method: string, path: string, { body, version, key, ...rest }: Ask = {}): Promise<T> {
  const answer = await fetch(`/api/v1${path}`, {
    method,
    headers: {
      accept: 'application/json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...(version === undefined ? {} : { 'if-match': `"${version}"` }),
      ...(key === undefined ? {} : { 'idempotency-key': key }),
    },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    ...rest,
  });
  const json: unknown = answer.status === 204 ? undefined : await answer.json().catch(() => null);
  if (answer.ok) return json as T;
  throw new Refused(answer.status, (json as Problem | null) ?? unreadable(answer.status));
}
