import { resolve } from 'node:path';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { readDraft, sourceOf } from '@/domain/writing/readDraft';
import { stopImporting } from '@/server/imports/importing';
import { beginProcedure } from '@/server/review/beginProcedure';
import { actOnNewProcedure } from '@/server/review/newProcedureForm';
import { readProposal } from '@/server/review/readProposal';
import { sheetsToCopy } from '@/server/review/sheetsToCopy';
import { readTemplates } from '@/server/review/templates';
import * as d from '../../factories/documents';
import { openTestBook } from '../../setup/database';
import { call, type Sent } from './support/call';
import { addPerson, makeNetwork, publishFirst, signedIn, type Member, type Network } from './support/network';
import { text } from './support/text';

let network: Network;
const who = (name: string): Member => network.people[name]!;
const actor = async (name: string) => (await signedIn(who(name))).actor;
beforeEach(async () => {
  await openTestBook({ contentDir: resolve('content') });
  network = await makeNetwork();
  await publishFirst('P-0142');
  await publishFirst('P-0500', { shopId: network.north, source: text({ title: 'Northern ways' }) });
});
afterAll(stopImporting);

const HOW_TO =
  '# Fit the fan\n\nWarning: Blades can cut. Stop it.\n\n1. Take it off\n2. Tighten to 10 N·m\n\n![A fan](fan.png)\n';
const textCall = (as: string, body: object) => call(who(as), 'POST', '/imports', { body });

async function form(fields: Record<string, string | File>): Promise<Sent> {
  const body = new FormData();
  for (const [name, value] of Object.entries(fields)) body.set(name, value);
  const request = new Request('http://x/', { method: 'POST', body });
  return {
    raw: await request.arrayBuffer(),
    headers: { 'content-type': request.headers.get('content-type') ?? '' },
  };
}
const drafts = async (as: string) => (await call(who(as), 'GET', '/proposals')).body.items as { id: string }[];

describe('POST /imports', () => {
  it('answers the draft that a text would make, and stores nothing', async () => {
    const { status, body } = await textCall('north.technician', { book: 'common', markdown: HOW_TO });
    expect(status).toBe(200);
    expect(body).toMatchObject({
      title: 'Fit the fan',
      steps: [
        { id: 'take-it-off', title: 'Take it off', cautions: 1 },
        { id: 'tighten-to-10-nm', title: 'Tighten to 10 N·m', cautions: 0 },
      ],
      cautions: [{ signal: 'WARNING', hazard: 'Blades', harm: 'can cut', avoid: 'Stop it.', steps: [1] }],
      figures: [{ text: '10 N·m', list: 'torques' }],
      leftOut: [{ what: 'Picture', where: 'step 2: Tighten to 10 N·m', quote: 'A fan fan.png' }],
    });
    expect(await drafts('north.technician')).toEqual([]);
  });

  it('takes a document as a file of a form', async () => {
    const file = new File([new Uint8Array(await d.docx([d.heading(1, 'Fit the fan'), d.point('Go on')]))], 'fan.docx');
    const { status, body } = await call(
      who('pier.owner'),
      'POST',
      '/imports',
      await form({ book: network.pier, file }),
    );
    expect([status, body.title, body.steps.length]).toEqual([200, 'Fit the fan', 1]);
  });

  it.each([
    ['north.apprentice', 'common', 403],
    ['north.apprentice', 'north', 403],
    ['north.technician', 'north', 200],
    ['pier.owner', 'north', 404],
    ['common.editor', 'common', 200],
    ['common.editor', 'north', 404],
    ['steward', 'common', 403],
    ['nobody', 'common', 404],
  ])('%s for the book %s: %i', async (as, book, status) => {
    const name = book === 'north' ? network.north : book;
    expect((await textCall(as, { book: name, markdown: HOW_TO })).status).toBe(status);
    const file = new File([HOW_TO], 'a.md');
    // Who writes for no book at all is refused before a file is read.
    const sent = (await call(who(as), 'POST', '/imports', await form({ book: name, file }))).status;
    expect(sent).toBe(as === 'nobody' ? 403 : status);
  });

  it('refuses what cannot be read, with its line; a larger file; a form without one', async () => {
    const bad = await textCall('north.senior', { book: 'common', markdown: `# T\n\n${'['.repeat(3000)}` });
    expect(bad).toMatchObject({ status: 422, body: { errors: [{ path: 'markdown', line: 3 }] } });
    const large = new File([new Uint8Array(5 * 1024 * 1024 + 1)], 'a.docx');
    const post = async (fields: Record<string, string | File>) =>
      call(who('north.senior'), 'POST', '/imports', await form(fields));
    expect((await post({ book: 'common', file: large })).status).toBe(413);
    expect(await post({ book: 'common' })).toMatchObject({ status: 422, body: { errors: [{ path: 'file' }] } });
    expect((await post({ file: new File([HOW_TO], 'a.md') })).status).toBe(404);
    const program = new File([new Uint8Array([0x4d, 0x5a, 0x90, 0, 3, 0, 0, 0])], 'a.docx');
    expect(await post({ book: 'common', file: program })).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'file' }] },
    });
    expect((await call(null, 'POST', '/imports', await form({ book: 'common' }))).status).toBe(401);
  });

  it('gives what POST /procedures takes; what was left out stays with the draft', async () => {
    const { body } = await textCall('north.senior', { book: 'common', markdown: HOW_TO });
    const origin = { kind: 'import', name: 'fan.md', leftOut: body.leftOut };
    const started = await call(who('north.senior'), 'POST', '/procedures', {
      body: { book: 'common', source: body.source, reason: 'Imported', origin },
    });
    expect(started).toMatchObject({ status: 201, body: { title: 'Fit the fan', state: 'draft', origin } });
    expect((await readProposal(await actor('north.senior'), started.body.id)).origin).toEqual(origin);
    const sent = await call(who('north.senior'), 'POST', `/proposals/${started.body.id}/submit`);
    expect(sent).toMatchObject({
      status: 422,
      body: { detail: expect.stringMatching(/^Line \d+: Still to fill in: /) as string },
    });
    const gone = await call(who('north.senior'), 'DELETE', `/proposals/${started.body.id}`);
    expect(gone.status).toBe(204);
  });
});

describe('what is not filled in', () => {
  it('keeps every template and the empty sheet from being sent in, and says where', { timeout: 60_000 }, async () => {
    const senior = await actor('north.senior');
    const templates = await readTemplates();
    expect(templates.length).toBeGreaterThanOrEqual(12);
    const beginnings = [
      { from: 'empty' as const },
      ...templates.map(({ name }) => ({ from: 'template' as const, name })),
    ];
    for (const beginning of beginnings) {
      const id = await beginProcedure(senior, 'common', 'Do the work', beginning);
      const { version, source } = await readProposal(senior, id);
      expect(source).toContain('title: Do the work');
      const put = await call(who('north.senior'), 'PUT', `/proposals/${id}`, {
        body: { reason: 'New' },
        headers: { 'if-match': `"${version}"` },
      });
      expect(put.body.check.toFillIn.length).toBeGreaterThan(3);
      const sent = await call(who('north.senior'), 'POST', `/proposals/${id}/submit`);
      expect({ beginning, status: sent.status }).toEqual({ beginning, status: 422 });
      expect(sent.body.detail).toMatch(/^Line \d+: Still to fill in: /);
      expect(sent.body.errors.map(({ path }: { path: string }) => path)).toContain('source.engines');
    }
  });

  it('lets it pass once nothing is left to fill in', async () => {
    const senior = await actor('north.senior');
    const id = await beginProcedure(senior, 'common', 'Do the work', { from: 'template', name: 'seal-a-cover' });
    const { version, source } = await readProposal(senior, id);
    const whole = source.replace('- fill-in', '- tarn-t18f').replace(/Fill in: /g, 'Done: ');
    const put = await call(who('north.senior'), 'PUT', `/proposals/${id}`, {
      body: { source: whole, reason: 'New' },
      headers: { 'if-match': `"${version}"` },
    });
    expect(put.body.check).toMatchObject({ ok: true, toFillIn: [] });
    expect((await call(who('north.senior'), 'POST', `/proposals/${id}/submit`)).status).toBe(200);
  });
});

describe('a copy', () => {
  it('has a number and title of its own, keeps steps and values, and says where it is from', async () => {
    const technician = await actor('north.technician');
    const id = await beginProcedure(technician, network.north, 'Reseal the other cover', {
      from: 'copy',
      number: 'P-0142',
    });
    const copy = await readProposal(technician, id);
    expect(copy).toMatchObject({
      title: 'Reseal the other cover',
      base: null,
      reason: 'Copied from P-0142 revision A.',
      origin: { kind: 'copy', number: 'P-0142', letter: 'A' },
      book: { kind: 'shop' },
      // A torque that nobody has checked for the new job.
      critical: true,
      agreementsNeeded: 2,
    });
    expect(copy.number).not.toBe('P-0142');
    const [was, is] = [readDraft(text()), readDraft(copy.source)];
    expect(is && was && sourceOf({ ...is, title: was.title })).toBe(was && sourceOf(was));
  });

  it.each([
    ['north.technician', 'P-0500', 'north', 201],
    ['north.technician', 'P-0500', 'common', 403],
    ['north.senior', 'P-0500', 'common', 403],
    ['north.editor', 'P-0500', 'common', 201],
    ['north.owner', 'P-0500', 'common', 201],
    ['pier.owner', 'P-0500', 'pier', 404],
    ['pier.owner', 'P-0500', 'common', 404],
    ['common.editor', 'P-0500', 'common', 404],
    ['pier.technician', 'P-0142', 'pier', 201],
    ['north.apprentice', 'P-0142', 'north', 403],
    ['north.technician', 'P-9999', 'north', 404],
  ])('%s copies %s into the book %s: %i', async (as, number, book, status) => {
    const to = book === 'common' ? 'common' : network[book as 'north' | 'pier'];
    const origin = { kind: 'copy', number, letter: 'A' };
    const sent = await call(who(as), 'POST', '/procedures', { body: { book: to, source: text(), origin } });
    expect(sent.status).toBe(status);
    const began = beginProcedure(await actor(as), to, 'T', { from: 'copy', number });
    if (status === 201) await began;
    else await expect(began).rejects.toMatchObject({ status });
  });

  it('never leaves its shop for another, though one person works in both', async () => {
    const both = await addPerson('both', [
      { in: { shop: network.north }, role: 'owner' },
      { in: { shop: network.pier }, role: 'owner' },
    ]);
    const { actor: owner } = await signedIn(both);
    await expect(beginProcedure(owner, network.pier, 'T', { from: 'copy', number: 'P-0500' })).rejects.toMatchObject({
      status: 403,
    });
  });

  it('is offered of sheets in use that one may read, and of no other', async () => {
    const numbers = async (as: string, q: string) =>
      (await sheetsToCopy(await actor(as), { q, sheet: '' })).map(({ number }) => number);
    expect(await numbers('north.technician', 'northern')).toEqual(['P-0500']);
    expect(await numbers('pier.technician', 'northern')).toEqual([]);
    expect(await numbers('north.technician', '')).toEqual([]);
    await call(who('common.editor'), 'POST', '/procedures/P-0142/withdraw', { body: { reason: 'It leaks' } });
    const began = beginProcedure(await actor('north.senior'), 'common', 'T', { from: 'copy', number: 'P-0142' });
    await expect(began).rejects.toMatchObject({ status: 409 });
  });
});

describe('the page', () => {
  const send = async (as: string, fields: Record<string, string | File>) => {
    const body = new FormData();
    for (const [name, value] of Object.entries(fields)) body.set(name, value);
    return actOnNewProcedure(await actor(as), new Request('http://x/procedures/new', { method: 'POST', body }));
  };
  const plain = async (as: string, fields: Record<string, string>) =>
    actOnNewProcedure(
      await actor(as),
      new Request('http://x/procedures/new', { method: 'POST', body: new URLSearchParams(fields) }),
    );

  it('gives back what was typed with what is missing', async () => {
    expect(await send('north.senior', { act: 'start', from: 'template', book: 'common', title: ' ' })).toMatchObject({
      is: 'form',
      status: 422,
      typed: { from: 'template', book: 'common' },
      errors: { title: 'Write which task it is.', template: 'Choose a template.' },
    });
    expect(
      await send('north.senior', { act: 'start', from: 'copy', book: 'common', title: 'T', q: 'cover' }),
    ).toMatchObject({
      status: 422,
      typed: { title: 'T', q: 'cover' },
      errors: { sheet: 'Look a sheet up, and choose it.' },
    });
    expect(await send('north.senior', { act: 'read', from: 'import', book: 'common', markdown: '' })).toMatchObject({
      status: 422,
      errors: { file: expect.stringMatching(/^Choose a file/) as string },
    });
    const refused = await send('north.technician', {
      act: 'start',
      from: 'copy',
      book: 'common',
      title: 'T',
      sheet: 'P-0500',
    });
    expect(refused).toMatchObject({
      status: 403,
      errors: { sheet: expect.stringMatching(/editor or owner/) as string },
    });
    const bad = await send('north.senior', { act: 'read', from: 'import', book: 'common', markdown: '> '.repeat(40) });
    expect(bad).toMatchObject({ status: 422, errors: { markdown: expect.stringMatching(/six deep/) as string } });
    const large = {
      act: 'read',
      from: 'import',
      book: 'common',
      title: 'T',
      file: new File([new Uint8Array(6e6)], 'a'),
    };
    expect(await send('north.senior', large)).toMatchObject({ status: 413, typed: { title: 'T', from: 'import' } });
  });

  it('looks up without starting anything', async () => {
    expect(
      await send('north.senior', { act: 'look-up', from: 'copy', book: 'common', title: 'T', q: 'cover' }),
    ).toMatchObject({
      is: 'form',
      status: 200,
      errors: {},
    });
    expect(await drafts('north.senior')).toEqual([]);
  });

  it('shows what a document holds, and starts the draft from what it showed', async () => {
    const read = await send('north.senior', {
      act: 'read',
      from: 'import',
      book: 'common',
      file: new File([HOW_TO], 'fan.md'),
    });
    if (read.is !== 'read') throw new Error('It was not read.');
    expect(await drafts('north.senior')).toEqual([]);
    const { imported, name, title } = read.document;
    const fields = {
      ...{ act: 'start-read', book: 'common', source: imported.source, name },
      leftOut: JSON.stringify(imported.leftOut),
    };
    expect(await plain('north.senior', { ...fields, title: ' ' })).toMatchObject({ is: 'read', status: 422 });
    const begun = await plain('north.senior', { ...fields, title: `${title} again` });
    if (begun.is !== 'begun') throw new Error('It was not started.');
    expect(await readProposal(await actor('north.senior'), begun.id)).toMatchObject({
      title: 'Fit the fan again',
      reason: 'Imported from “fan.md”. 1 passage could not be taken over and is listed with it.',
      origin: { kind: 'import', name: 'fan.md', leftOut: [{ what: 'Picture', quote: 'A fan fan.png' }] },
    });
    await expect(plain('north.senior', { ...fields, leftOut: 'x', title: 'T' })).rejects.toMatchObject({ status: 400 });
    await expect(plain('pier.owner', { ...fields, book: network.north, title: 'T' })).rejects.toMatchObject({
      status: 404,
    });
  });
});
