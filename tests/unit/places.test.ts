import { describe, expect, it } from 'vitest';
import { initialsOf, placesFor } from '@/layouts/places';
import type { Membership } from '@/domain/people/may';

const seen = (memberships: Membership[], shops: string[] = []) =>
  placesFor({ personId: 'p', memberships }, shops).map(({ key }) => key);

describe('the navigation', () => {
  it('shows an apprentice only what an apprentice may use', () => {
    expect(seen([{ in: 'shop', shopId: 's', role: 'apprentice' }])).toEqual([
      'look-up',
      'bulletins',
      'flags',
      'handbook',
    ]);
  });
  it('shows a technician their proposals and an editor the review desk', () => {
    expect(seen([{ in: 'shop', shopId: 's', role: 'technician' }])).toEqual([
      'look-up',
      'bulletins',
      'proposals',
      'flags',
      'handbook',
    ]);
    expect(seen([{ in: 'common', role: 'editor' }])).toContain('review-desk');
  });
  it('shows a senior technician the review desk only where the shop has one editor', () => {
    const senior: Membership[] = [{ in: 'shop', shopId: 's', role: 'senior' }];
    expect(seen(senior)).not.toContain('review-desk');
    expect(seen(senior, ['s'])).toContain('review-desk');
  });
  it('shows the shop to its owner and to the steward, who change its settings', () => {
    expect(seen([{ in: 'shop', shopId: 's', role: 'owner' }])).toContain('shop');
    expect(seen([{ in: 'network', role: 'steward' }])).toContain('shop');
    for (const role of ['apprentice', 'technician', 'senior', 'editor'] as const)
      expect(seen([{ in: 'shop', shopId: 's', role }])).not.toContain('shop');
    expect(seen([{ in: 'common', role: 'editor' }])).not.toContain('shop');
  });
});

describe('initials', () => {
  it.each([
    ['Rowan Achterberg', 'RA'],
    ['  Anna van der Berg ', 'AB'],
    ['Cher', 'C'],
  ])('of %s are %s', (name, initials) => expect(initialsOf(name)).toBe(initials));
});
