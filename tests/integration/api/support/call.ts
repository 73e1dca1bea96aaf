import type { APIContext } from 'astro';
import { NOBODY } from '@/server/accounts/whoIs';
import { signedIn, type Member } from './network';

type Module = Record<string, (context: APIContext) => Promise<Response> | Response>;

const modules = import.meta.glob<Module>('../../../../src/pages/api/v1/**/*.ts');
const ROUTES = Object.entries(modules)
  .map(([file, load]) => {
    const path = file.replace(/^.*\/api\/v1/, '').replace(/(\/index)?\.ts$/, '');
    const names: string[] = [];
    const pattern = path.replace(/\[(\.\.\.)?(\w+)\]/g, (_, rest: string | undefined, name: string) => {
      names.push(name);
      return rest ? '(.*)' : '([^/]+)';
    });
    return { path, load, names, pattern: new RegExp(`^${pattern}$`), dynamic: (path.match(/\[/g) ?? []).length };
  })
  // As Astro ranks them: literal parts before parameters, the catch-all last.
  .sort((a, b) => Number(a.path.includes('...')) - Number(b.path.includes('...')) || a.dynamic - b.dynamic);

export interface Sent {
  body?: unknown;
  /** Sent as it is, instead of `body` as JSON. */
  raw?: BodyInit;
  headers?: Record<string, string>;
}

export interface Answered {
  status: number;
  headers: Headers;
  /** Cookies that the route set, by name. */
  cookies: Record<string, string>;
  // Tests look into the body as they go; what it must hold is what they assert.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  body: any;
}

/** Calls a route as a signed-in person (or as nobody), through the file that Astro would choose. */
export async function call(as: Member | null, method: string, path: string, sent: Sent = {}): Promise<Answered> {
  const url = new URL(`http://book.test/api/v1${path}`);
  const below = url.pathname.replace('/api/v1', '');
  const found = ROUTES.find((route) => route.pattern.test(below));
  if (!found) throw new Error(`No route for ${path}`);
  const values = found.pattern.exec(below)?.slice(1) ?? [];
  const raw = sent.raw ?? (sent.body === undefined ? undefined : JSON.stringify(sent.body));
  const request = new Request(url, {
    method,
    headers: { ...(raw === undefined ? {} : { 'content-type': 'application/json' }), ...sent.headers },
    ...(raw === undefined ? {} : { body: raw, duplex: 'half' }),
  } as RequestInit);
  const who = as && (await signedIn(as));
  const cookies: Record<string, string> = {};
  const context = {
    request,
    url,
    params: Object.fromEntries(found.names.map((name, i) => [name, decodeURIComponent(values[i] ?? '')])),
    cookies: { set: (name: string, value: string) => void (cookies[name] = value) },
    locals: { actor: who?.actor ?? NOBODY, person: who?.me ?? null },
  } as unknown as APIContext;
  const module = await found.load();
  const handler = module[method] ?? module['ALL'];
  if (!handler) throw new Error(`${found.path} has no handler for ${method}`);
  const response = await handler(context);
  const body = await response.text();
  return { status: response.status, headers: response.headers, cookies, body: body === '' ? null : JSON.parse(body) };
}
