import type { FeedEvent } from '@/domain/feed/entry';

/** One entry of a feed; whatever a test cares about is given. */
export const feedEvent = (given: Partial<FeedEvent> = {}): FeedEvent => ({
  id: '0192f3a4-0000-7000-8000-000000000001',
  kind: 'published',
  at: '2026-03-04T05:06:07.000Z',
  number: 'P-0142',
  letter: 'C',
  title: 'Reseal the valve cover',
  book: 'Common book',
  author: 'Rowan Achterberg',
  reviewers: ['Ines Okafor'],
  reason: 'It wept at the corners',
  criticalReasons: ['a torque changes: Cover bolt'],
  supersedes: 'B',
  ...given,
});
