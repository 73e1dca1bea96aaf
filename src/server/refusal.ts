import { StorageBusy, StorageFull } from '@db/storageErrors';

/** One thing that is wrong, and where: a field, or a line and column of a text, both from 1. */
export interface RefusalError {
  path: string;
  message: string;
  line?: number;
  column?: number;
}

interface RefusalOptions {
  errors?: RefusalError[];
  headers?: Record<string, string>;
  cause?: unknown;
  /** Further members of the problem document, for example the text that won a race. */
  extra?: Record<string, unknown>;
}

/**
 * A use case says no. Thrown, because a refusal ends everything the caller was doing; the endpoint turns
 * it into an RFC 9457 problem document and a page into a screen. `detail` is for the reader: what is
 * wrong and what to do.
 */
export class Refusal extends Error {
  override name = 'Refusal';
  readonly type: string;
  readonly errors: RefusalError[] | undefined;
  readonly headers: Record<string, string>;
  readonly extra: Record<string, unknown>;

  constructor(
    readonly status: number,
    kind: string,
    readonly title: string,
    readonly detail: string,
    { errors, headers = {}, extra = {}, cause }: RefusalOptions = {},
  ) {
    super(detail, { cause });
    this.type = `/problems/${kind}`;
    this.errors = errors;
    this.headers = headers;
    this.extra = extra;
  }
}

export const malformed = (detail: string, errors?: RefusalError[]) =>
  new Refusal(400, 'malformed', 'Not understood', detail, { errors });

export const signedOut = () =>
  new Refusal(401, 'signed-out', 'Signed out', 'Sign in first.', { headers: { 'WWW-Authenticate': 'Session' } });

export const forbidden = (detail: string) => new Refusal(403, 'forbidden', 'Not yours to do', detail);

/** Also for things that exist but that this person must not know of. */
export const notFound = (detail = 'There is nothing here, or you may not see it.') =>
  new Refusal(404, 'not-found', 'Not found', detail);

/** The reader acted on something that has changed since. `extra` can carry what stands now. */
export const stale = (detail: string, extra?: Record<string, unknown>) =>
  new Refusal(409, 'stale', 'Changed in the meantime', detail, { extra });

/** The rules do not allow it as things stand. `extra` can carry what stands now. */
export const conflict = (detail: string, extra?: Record<string, unknown>) =>
  new Refusal(409, 'conflict', 'Not as things stand', detail, { extra });

export const tooLarge = (detail: string) => new Refusal(413, 'too-large', 'Too large', detail);

export const invalid = (detail: string, errors: RefusalError[] = []) =>
  new Refusal(422, 'invalid', 'Not accepted', detail, { errors });

/** How a rule of the domain says no. */
export interface SaidNo {
  kind: 'hidden' | 'forbidden' | 'invalid' | 'conflict';
  why: string;
}

/**
 * What a rule refused, as the caller is told it.
 *
 * @param field of the call that an `invalid` is about
 */
export function refusalOf({ kind, why }: SaidNo, field = ''): Refusal {
  switch (kind) {
    case 'hidden':
      return notFound();
    case 'forbidden':
      return forbidden(why);
    case 'invalid':
      return invalid(why, [{ path: field, message: why }]);
    case 'conflict':
      return conflict(why);
  }
}

export const preconditionRequired = (detail: string) =>
  new Refusal(428, 'precondition-required', 'Say which version you read', detail);

/** `seconds` until trying again can work. */
export const tooManyTries = (detail: string, seconds: number) =>
  new Refusal(429, 'too-many-tries', 'Too many tries', detail, { headers: { 'Retry-After': String(seconds) } });

/** Any error as a refusal: storage faults become 503, an unknown one 500 without a word of its inside. */
export function asRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof StorageBusy)
    return new Refusal(503, 'busy', 'Busy', 'The book is busy. Nothing was saved; try again in a moment.', {
      headers: { 'Retry-After': '2' },
      cause: error,
    });
  if (error instanceof StorageFull)
    return new Refusal(
      503,
      'storage',
      'Cannot save',
      'The server cannot write to its disk. Nothing was saved; tell whoever runs it.',
      { cause: error },
    );
  return new Refusal(500, 'fault', 'Something went wrong', 'The server made a mistake. Nothing was saved.', {
    cause: error,
  });
}
