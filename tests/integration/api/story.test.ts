import { expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { call } from './support/call';
import { type Member } from './support/network';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();

it('goes from a proposal over a return and two agreements to the sheet that everybody works from', async () => {
  const senior = who('north.senior');
  const started = await call(senior, 'POST', '/procedures/P-0142/proposals', {
    body: { base: 'A', source: text({ nm: 12 }), reason: '' },
  });
  expect(started.status).toBe(201);
  expect(started.body).toMatchObject({ state: 'draft', version: 1, number: 'P-0142', base: 'A', critical: true });
  const at = `/proposals/${started.body.id as string}`;
  expect(started.headers.get('location')).toBe(`/api/v1${at}`);
  expect(started.headers.get('etag')).toBe('"1"');

  const noReason = await call(senior, 'POST', `${at}/submit`);
  expect(noReason.status).toBe(422);
  expect(noReason.body.errors).toEqual([{ path: 'reason', message: expect.stringContaining('reason') as string }]);
  expect(await call(who('common.editor'), 'GET', at)).toMatchObject({ status: 404 });

  const reasoned = await call(senior, 'PUT', at, {
    body: { reason: 'Bolts came loose' },
    headers: { 'if-match': '"1"' },
  });
  expect(reasoned).toMatchObject({ status: 200, body: { version: 2, check: { ok: true } } });
  const submitted = await call(senior, 'POST', `${at}/submit`, { headers: { 'if-match': '"2"' } });
  expect(submitted).toMatchObject({ status: 200, body: { state: 'proposed', agreementsNeeded: 2, agreements: 0 } });

  const desk = await call(who('common.editor'), 'GET', '/review-desk');
  expect(desk.body.items).toMatchObject([{ id: started.body.id, next: 'agree', critical: true }]);
  const returned = await call(who('common.editor'), 'POST', `${at}/return`, {
    body: { reason: 'Say for which washer', anchor: 'step:tighten' },
  });
  expect(returned.body).toMatchObject({
    state: 'returned',
    remarks: [{ kind: 'returned', text: 'Say for which washer', anchor: 'step:tighten' }],
  });

  const improved = await call(senior, 'PUT', at, {
    body: { source: text({ nm: 12, word: 'lint-free' }) },
    headers: { 'if-match': returned.headers.get('etag')! },
  });
  expect(improved.status).toBe(200);
  expect((await call(senior, 'POST', `${at}/submit`)).body.state).toBe('proposed');

  expect((await call(senior, 'POST', `${at}/agree`)).status).toBe(403);
  expect((await call(who('common.editor'), 'POST', `${at}/agree`)).body.agreements).toBe(1);
  const alone = await call(who('common.editor'), 'POST', `${at}/publish`);
  expect(alone.status).toBe(409);
  expect(alone.body.detail).toContain('One more editor must agree');
  expect((await call(who('common.editor2'), 'POST', `${at}/agree`)).body.agreements).toBe(2);
  const published = await call(who('common.editor'), 'POST', `${at}/publish`);
  expect(published).toMatchObject({ status: 200, body: { state: 'published', publishedLetter: 'B' } });

  const sheet = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142');
  expect(sheet.body).toMatchObject({
    number: 'P-0142',
    revision: { letter: 'B', state: 'published', reason: 'Bolts came loose', author: { name: 'north senior' } },
    current: { letter: 'B' },
    earlier: 1,
    openProposals: 0,
  });
  expect(sheet.body.revision.reviewers.map((p: Member) => p.name)).toEqual(['common.editor', 'common.editor2']);
  expect(sheet.body.source).toContain('lint-free');
  const old = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142/revisions/A');
  expect(old.body).toMatchObject({ revision: { letter: 'A', state: 'superseded' }, current: { letter: 'B' } });
  const history = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142/revisions');
  expect(history.body.items.map((r: { letter: string }) => r.letter)).toEqual(['B', 'A']);
  const compared = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142/compare?from=A&to=B');
  expect(compared.body).toMatchObject({ from: { letter: 'A' }, to: { letter: 'B' }, comparison: { identical: false } });
  expect(await verifyAudit()).toMatchObject({ ok: true });
});

it('starts a new procedure under the next number, unseen until it is published', async () => {
  const technician = who('north.technician');
  const started = await call(technician, 'POST', '/procedures', {
    body: { book: shop('north'), source: text({ title: 'Fit the test pump' }), reason: 'We had none' },
  });
  expect(started).toMatchObject({ status: 201, body: { number: 'P-1001', base: null, state: 'draft', version: 1 } });
  expect((await call(technician, 'GET', '/procedures/P-1001')).status).toBe(404);
  const at = `/proposals/${started.body.id as string}`;
  await call(technician, 'POST', `${at}/submit`);
  expect((await call(who('pier.editor'), 'GET', at)).status).toBe(404);
  // A new sheet brings its torque with it, so it needs a second pair of eyes.
  await call(who('north.owner'), 'POST', `${at}/agree`);
  const published = await call(who('north.editor'), 'POST', `${at}/publish`);
  expect(published.body).toMatchObject({ state: 'published', publishedLetter: 'A' });
  expect((await call(who('north.apprentice'), 'GET', '/procedures/P-1001')).status).toBe(200);
  expect((await call(who('pier.owner'), 'GET', '/procedures/P-1001')).status).toBe(404);
  const lists = await Promise.all(
    ['north.apprentice', 'pier.owner'].map(async (name) => (await call(who(name), 'GET', '/procedures')).body.items),
  );
  expect(lists.map((items: { number: string }[]) => items.map((i) => i.number))).toEqual([
    ['P-0142', 'P-1001'],
    ['P-0142'],
  ]);
});
