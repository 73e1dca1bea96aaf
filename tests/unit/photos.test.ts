import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Actor } from '@/domain/people/may';
import {
  KEPT_PIXELS,
  keptSize,
  mayRemove,
  mayTakeOff,
  OWN_REMOVAL_MS,
  refusedType,
  type SentPhoto,
} from '@/domain/photos/photos';
import { turns } from '@/server/photos/turns';

const person = (personId: string, ...memberships: Actor['memberships']): Actor => ({ personId, memberships });
const editor = person('ed', { in: 'common', role: 'editor' });
const sender = person('me', { in: 'shop', shopId: 'north', role: 'technician' });
const other = person('you', { in: 'shop', shopId: 'north', role: 'owner' });
const AT = '2026-12-01T08:00:00.000Z';
const after = (ms: number) => new Date(Date.parse(AT) + ms).toISOString();
const sent = (more: Partial<SentPhoto> = {}): SentPhoto => ({
  book: { kind: 'common' },
  uploaderId: 'me',
  attachedAt: AT,
  removed: false,
  unsent: false,
  ...more,
});

describe('removing a photo', () => {
  it('is for an editor of its book at any time, and for its sender for ten minutes', () => {
    expect(mayRemove(editor, sent(), after(1e9))).toEqual({ ok: true });
    expect(mayRemove(sender, sent(), after(OWN_REMOVAL_MS))).toEqual({ ok: true });
    expect(mayRemove(sender, sent(), after(OWN_REMOVAL_MS + 1))).toMatchObject({ ok: false, kind: 'forbidden' });
    expect(mayRemove(other, sent(), AT)).toMatchObject({ ok: false, kind: 'forbidden' });
  });

  it('in a shop’s own book is not for the editors of the common one', () => {
    const photo = sent({ book: { kind: 'shop', shopId: 'north' } });
    expect(mayRemove(editor, photo, AT)).toMatchObject({ ok: false });
    expect(mayRemove(person('x', { in: 'shop', shopId: 'north', role: 'editor' }), photo, AT)).toEqual({ ok: true });
    expect(mayRemove(person('x', { in: 'shop', shopId: 'pier', role: 'editor' }), photo, AT)).toMatchObject({
      ok: false,
    });
  });

  it('happens once', () => {
    expect(mayRemove(editor, sent({ removed: true }), AT)).toMatchObject({ kind: 'conflict' });
    expect(mayRemove(other, sent({ removed: true }), AT)).toMatchObject({ kind: 'forbidden' });
  });

  it('without a word is for the sender alone, before anybody saw it', () => {
    expect(mayTakeOff(sender, sent({ unsent: true }))).toBe(true);
    expect(mayTakeOff(sender, sent())).toBe(false);
    expect(mayTakeOff(editor, sent({ unsent: true }))).toBe(false);
  });
});

describe('the size that is kept', () => {
  it('has 12 megapixels at most, keeps the proportions and never enlarges', () => {
    const side = fc.integer({ min: 1, max: 12_000 });
    fc.assert(
      fc.property(side, side, (width, height) => {
        const kept = keptSize(width, height);
        expect(kept.width * kept.height).toBeLessThanOrEqual(KEPT_PIXELS);
        expect(kept.width).toBeLessThanOrEqual(width);
        expect(kept.height).toBeLessThanOrEqual(height);
        if (width * height <= KEPT_PIXELS) expect(kept).toEqual({ width, height });
        // Each side is rounded down by less than one pixel.
        else if (Math.min(kept.width, kept.height) > 100)
          expect(Math.abs(kept.width / kept.height / (width / height) - 1)).toBeLessThan(0.02);
      }),
    );
    expect(keptSize(8192, 6144)).toEqual({ width: 4000, height: 3000 });
  });
});

it('says of HEIC how to make a JPEG, and of anything else what is taken', () => {
  for (const mime of ['image/jpeg', 'image/png', 'image/webp', 'image/avif']) expect(refusedType(mime)).toBeNull();
  expect(refusedType('image/heic')).toMatch(/HEIC.*as JPEG.*Most compatible/);
  for (const mime of ['image/svg+xml', 'application/xml', 'image/gif', 'text/html', null])
    expect(refusedType(mime)).toBe('This is no photo that can be read here. Send a JPEG, PNG, WebP or AVIF picture.');
});

describe('taking turns', () => {
  it('lets few in at once, in the order they came, and turns away who would wait too long', async () => {
    const inTurn = turns(2, 3);
    let inside = 0;
    let most = 0;
    const order: number[] = [];
    const open: (() => void)[] = [];
    const work = (n: number) =>
      inTurn(async () => {
        most = Math.max(most, ++inside);
        order.push(n);
        await new Promise<void>((go) => open.push(go));
        inside -= 1;
        if (n === 1) throw new Error('failed');
        return n;
      });
    const all = [0, 1, 2, 3, 4].map((n) => work(n).catch((error: Error) => error.message));
    await expect(work(5)).rejects.toMatchObject({ status: 503, headers: { 'Retry-After': '5' } });
    while (order.length < 5 || open.length > 0) {
      open.shift()?.();
      await new Promise((go) => setTimeout(go, 0));
    }
    expect(await Promise.all(all)).toEqual([0, 'failed', 2, 3, 4]);
    expect(order).toEqual([0, 1, 2, 3, 4]);
    expect(most).toBe(2);
    expect(inside).toBe(0);
  });
});
