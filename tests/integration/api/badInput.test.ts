import { beforeEach, describe, expect, it, vi } from 'vitest';
import { readSheet } from '@/server/book/sheet';
import { PER_MINUTE } from '@/server/http/rateLimit';
import { readProposal } from '@/server/review/readProposal';
import { call, type Sent } from './support/call';
import { publishFirst, signedIn } from './support/network';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();

beforeEach(() => publishFirst('P-0500', { shopId: shop('north') }));

const json = { 'content-type': 'application/json' };
const unknownId = '0190a000-0000-7000-8000-000000000000';
const cross = { origin: 'https://elsewhere.example' };

const endless = () =>
  new ReadableStream<Uint8Array>({
    pull(controller) {
      controller.enqueue(new Uint8Array(16 * 1024).fill(0x20));
    },
  });

const TABLE: [string, number, string, string, Sent][] = [
  ['broken JSON', 400, 'POST', '/check', { raw: '{"source":', headers: json }],
  ['an empty body', 400, 'POST', '/check', { headers: json }],
  ['JSON that is not UTF-8', 400, 'POST', '/check', { raw: new Uint8Array([0x22, 0xff, 0x22]), headers: json }],
  [
    'a form',
    415,
    'POST',
    '/check',
    { raw: 'source=x', headers: { 'content-type': 'application/x-www-form-urlencoded' } },
  ],
  [
    'a body without a type',
    415,
    'POST',
    '/check',
    { raw: new Uint8Array([0x7b, 0x7d]), headers: { 'content-type': '' } },
  ],
  [
    'a declared length over the limit',
    413,
    'POST',
    '/check',
    { raw: '{}', headers: { ...json, 'content-length': '200000' } },
  ],
  ['a body over the limit', 413, 'POST', '/check', { raw: `"${'x'.repeat(200_000)}"`, headers: json }],
  ['an endless body without a length', 413, 'POST', '/check', { raw: endless(), headers: json }],
  ['a text over 64 KB', 422, 'POST', '/check', { body: { source: 'x'.repeat(66_000) } }],
  ['a missing field', 422, 'POST', '/check', { body: {} }],
  ['a list for an object', 422, 'POST', '/check', { body: [] }],
  ['a number for a text', 422, 'POST', '/check', { body: { source: 7 } }],
  [
    'a reason of 5,000 characters',
    422,
    'POST',
    '/procedures/P-0142/proposals',
    { body: { base: 'A', source: text(), reason: 'x'.repeat(5000) } },
  ],
  ['a base that is no letter', 422, 'POST', '/procedures/P-0142/proposals', { body: { base: 'O', source: text() } }],
  [
    'a broken text for a draft',
    422,
    'POST',
    '/procedures/P-0142/proposals',
    { body: { base: 'A', source: 'no front matter' } },
  ],
  ['a broken text for a new procedure', 422, 'POST', '/procedures', { body: { book: 'common', source: '<Step' } }],
  ['a book that is none', 404, 'POST', '/procedures', { body: { book: 'nowhere', source: text() } }],
  ['a limit of 0', 422, 'GET', '/procedures?limit=0', {}],
  ['a limit that is no number', 422, 'GET', '/procedures?limit=many', {}],
  ['a comparison without letters', 422, 'GET', '/procedures/P-0142/compare', {}],
  ['a comparison with an unknown revision', 404, 'GET', '/procedures/P-0142/compare?from=A&to=B', {}],
  ['an unknown procedure', 404, 'GET', '/procedures/P-0999', {}],
  ['a number that is none', 404, 'GET', "/procedures/P-1'%20OR%201=1", {}],
  ['an unknown revision', 404, 'GET', '/procedures/P-0142/revisions/B', {}],
  ['a revision that is no letter', 404, 'GET', '/procedures/P-0142/revisions/O', {}],
  ['an unknown proposal', 404, 'GET', `/proposals/${unknownId}`, {}],
  ['a proposal id that is none', 404, 'GET', '/proposals/1', {}],
  ['an unknown call', 404, 'GET', '/nothing/here', {}],
  ['a method that is not there', 405, 'DELETE', '/procedures', {}],
  ['another site', 403, 'POST', '/check', { body: { source: text() }, headers: cross }],
  [
    'a browser that hides where it comes from',
    403,
    'POST',
    '/check',
    { body: { source: text() }, headers: { 'sec-fetch-site': 'cross-site' } },
  ],
  ['an origin of nowhere', 403, 'POST', '/check', { body: { source: text() }, headers: { origin: 'null' } }],
  [
    'a key with spaces',
    422,
    'POST',
    '/procedures',
    { body: { book: 'common', source: text() }, headers: { 'idempotency-key': 'a b' } },
  ],
];

describe('bad input', () => {
  it.each(TABLE)('%s answers %i', async (_, status, method, path, sent) => {
    const answer = await call(who('north.senior'), method, path, sent);
    expect(answer.status).toBe(status);
    expect(answer.headers.get('content-type')).toBe('application/problem+json');
    expect(answer.body).toMatchObject({ status, type: expect.any(String), title: expect.any(String) });
    expect(answer.body.detail).toMatch(/^[A-Z].*[.]$/s);
    if (status === 422) expect(answer.body.errors.length).toBeGreaterThan(0);
  });

  it.each([
    ['GET', '/me'],
    ['GET', '/procedures'],
    ['GET', '/procedures/P-0142'],
    ['POST', '/check'],
    ['GET', '/review-desk'],
    ['GET', `/proposals/${unknownId}`],
  ])('signed out, %s %s answers 401', async (method, path) => {
    const answer = await call(null, method, path, method === 'POST' ? { body: { source: '' } } : {});
    expect(answer).toMatchObject({ status: 401, body: { status: 401 } });
  });

  it('answers an unseen procedure with the same bytes as an unknown one', async () => {
    const [unseen, unknown] = [
      await call(who('pier.owner'), 'GET', '/procedures/P-0500'),
      await call(who('pier.owner'), 'GET', '/procedures/P-0501'),
    ];
    expect(unseen.status).toBe(404);
    expect(unseen.body).toEqual(unknown.body);
  });

  it('is not brought down by a NUL, which ends a statement for the database', async () => {
    expect((await call(who('north.senior'), 'GET', '/procedures?cursor=%00')).status).toBe(200);
    const { actor } = await signedIn(who('north.senior'));
    await expect(readSheet(actor, 'P-0142\0')).rejects.toMatchObject({ status: 404 });
    await expect(readProposal(actor, '\0')).rejects.toMatchObject({ status: 404 });
  });

  it('names what a method may be', async () => {
    const answer = await call(who('north.senior'), 'PATCH', '/procedures');
    expect(answer.headers.get('allow')).toBe('GET, POST, HEAD, OPTIONS');
    expect(await call(who('north.senior'), 'HEAD', '/procedures/P-0142')).toMatchObject({ status: 200 });
    expect(await call(who('north.senior'), 'OPTIONS', '/procedures')).toMatchObject({ status: 204 });
  });

  it('gives the line and column of what is wrong in a text, where it is sent and where it is proposed', async () => {
    const broken = text().replace('<Torque of="cover-bolt" />', '<Torque of="head-bolt" />');
    const line = broken.split('\n').findIndex((l) => l.includes('head-bolt')) + 1;
    const checked = await call(who('north.senior'), 'POST', '/check', { body: { source: broken } });
    expect(checked).toMatchObject({ status: 200, body: { ok: false, errors: [{ line }] } });
    const started = await call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: broken },
    });
    expect(started).toMatchObject({
      status: 422,
      body: { errors: [{ path: expect.stringMatching(/^source/), line, column: expect.any(Number) }] },
    });
  });

  it('keeps a draft that cannot be read, and refuses to send it in', async () => {
    const senior = who('north.senior');
    const { body: draft } = await call(senior, 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ nm: 11 }), reason: 'Why' },
    });
    const half = text({ nm: 11 }).replace('</Step>', '');
    const saved = await call(senior, 'PUT', `/proposals/${draft.id}`, {
      body: { source: half },
      headers: { 'if-match': '"1"' },
    });
    expect(saved).toMatchObject({
      status: 200,
      body: { source: half, title: 'Reseal the test cover', check: { ok: false } },
    });
    expect(saved.body.check.errors[0]).toMatchObject({ line: expect.any(Number), column: expect.any(Number) });
    const sent = await call(senior, 'POST', `/proposals/${draft.id}/submit`);
    expect(sent).toMatchObject({
      status: 422,
      body: { errors: [{ line: expect.any(Number), column: expect.any(Number) }] },
    });
    expect((await call(senior, 'GET', `/proposals/${draft.id}`)).body).toMatchObject({ state: 'draft', source: half });
  });

  it('refuses to send in a text that changes nothing', async () => {
    const senior = who('north.senior');
    const { body: draft } = await call(senior, 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text(), reason: 'Why' },
    });
    const sent = await call(senior, 'POST', `/proposals/${draft.id}/submit`);
    expect(sent).toMatchObject({ status: 422, body: { errors: [{ path: 'source' }] } });
  });

  it.each(['return', 'decline'])('wants a reason to %s', async (verb) => {
    const { body: draft } = await call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ nm: 11 }), reason: 'Why' },
    });
    await call(who('north.senior'), 'POST', `/proposals/${draft.id}/submit`);
    for (const body of [{}, { reason: '   ' }]) {
      const answer = await call(who('common.editor'), 'POST', `/proposals/${draft.id}/${verb}`, { body });
      expect(answer).toMatchObject({ status: 422, body: { errors: [{ path: 'reason' }] } });
    }
  });

  it('wants If-Match for a save', async () => {
    const { body: draft } = await call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ nm: 11 }) },
    });
    const answer = await call(who('north.senior'), 'PUT', `/proposals/${draft.id}`, { body: { reason: 'Why' } });
    expect(answer).toMatchObject({ status: 428, body: { detail: expect.stringContaining('If-Match') } });
  });

  it('takes calls of programs and of its own pages', async () => {
    const { body } = { body: { source: text() } };
    for (const headers of [{}, { origin: 'http://book.test' }, { 'sec-fetch-site': 'same-origin' }] as Record<
      string,
      string
    >[])
      expect((await call(who('north.senior'), 'POST', '/check', { body, headers })).status).toBe(200);
  });

  it('slows down a loop gone wild', async () => {
    const person = who('pier.technician');
    const calls = Array.from({ length: PER_MINUTE.changing + 1 }, () =>
      call(person, 'DELETE', `/proposals/${unknownId}`),
    );
    const answers = await Promise.all(calls);
    const slowed = answers.filter((a) => a.status === 429);
    expect(slowed).toHaveLength(1);
    expect(Number(slowed[0]!.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await call(person, 'GET', '/procedures')).status).toBe(200);
  });
});

it('says nothing of its inside where it fails, and logs it once with the id it tells', async () => {
  const log = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  const { endpoint } = await import('@/server/http/endpoint');
  const { readMe } = await import('@/domain/api/operations/me');
  const failing = endpoint(readMe, () => Promise.reject(new Error('secret inside')));
  const response = await failing({
    request: new Request('http://book.test/api/v1/me'),
    url: new URL('http://book.test/api/v1/me'),
    params: {},
    locals: { actor: { personId: 'someone', memberships: [] }, person: null },
  } as never);
  const body = await response.text();
  expect(response.status).toBe(500);
  expect(body).not.toContain('secret');
  const id = response.headers.get('x-request-id')!;
  expect(JSON.parse(body)).toMatchObject({ status: 500, instance: `urn:uuid:${id}` });
  expect(log).toHaveBeenCalledTimes(1);
  expect(log.mock.calls[0]![0]).toContain(id);
  log.mockRestore();
});
