import { expect, it } from 'vitest';
import { jpegOf } from '../../factories/pictures';
import { call } from '../api/support/call';
import { waiting } from '../api/support/review';
import { useNetwork } from '../api/support/useNetwork';
import { picture, statusOf, upload } from './support';

const { who } = useNetwork();

it("a photo put to a returned reason is its author's alone until it is sent in, by its address too", async () => {
  const author = who('north.senior');
  const { id } = await waiting(author, 'P-0142');
  const back = await call(who('common.editor'), 'POST', `/proposals/${id}/return`, { body: { reason: 'Show it.' } });
  expect(back.status).toBe(200);
  const sent = await upload(author, await jpegOf());
  const photo = sent.body.id as string;
  const put = await call(author, 'POST', `/proposals/${id}/photos`, { body: { photos: [photo] } });
  expect(put.status).toBe(201);
  expect(await statusOf(picture(author, photo))).toBe(200);
  for (const name of ['common.editor', 'pier.apprentice']) {
    expect(await statusOf(picture(who(name), photo)), name).toBe(404);
    expect((await call(who(name), 'GET', `/proposals/${id}`)).body.photos, name).toEqual([]);
  }
});
