import type { PersonRef } from '@/domain/api/schemas/common';
import type { Proposal, Remark, TrailEntry } from '@/domain/api/schemas/proposals';

export const AUTHOR: PersonRef = { id: 'author', name: 'Wren Castellan', shop: 'Hollow Road Engines' };
export const EDITOR: PersonRef = { id: 'editor', name: 'Otto Lindqvist', shop: null };
export const SECOND: PersonRef = { id: 'second', name: 'Maeve Sorrel', shop: null };

/** A critical change to P-0142 that waits for review, as the API tells it to an editor who has not agreed. */
export const proposal = (change: Partial<Proposal> = {}): Proposal => ({
  id: '01900000-0000-7000-8000-000000000001',
  number: 'P-0142',
  title: 'Reseal the valve cover',
  book: { kind: 'common', shopId: null, name: 'Common book' },
  state: 'proposed',
  version: 2,
  base: 'C',
  stale: false,
  author: AUTHOR,
  reason: 'It weeps at ten.',
  critical: true,
  criticalReasons: ['a torque changes: Cover bolt'],
  severity: { level: 'serious', because: ['a torque changes (Cover bolt)'] },
  takesBack: [],
  agreementsNeeded: 2,
  agreements: 0,
  createdAt: '2026-11-27T09:00:00.000Z',
  updatedAt: '2026-11-28T09:00:00.000Z',
  proposedAt: '2026-11-28T09:00:00.000Z',
  source: '',
  origin: null,
  agreed: [],
  failing: [],
  remarks: [],
  photos: [],
  trail: [],
  currentLetter: 'C',
  publishedLetter: null,
  may: { edit: false, submit: false, return: true, decline: true, agree: true, override: false, publish: false },
  whyNot: {},
  ...change,
});

export const remark = (anchor: string | null, change: Partial<Remark> = {}): Remark => ({
  id: `remark on ${anchor ?? 'the whole'}`,
  kind: 'returned',
  person: EDITOR,
  at: '2026-11-29T09:00:00.000Z',
  text: 'Say how it was measured.',
  anchor,
  ...change,
});

export const happened = (what: TrailEntry['what'], person: PersonRef, day: number): TrailEntry => ({
  what,
  person,
  at: `2026-11-${String(day).padStart(2, '0')}T09:00:00.000Z`,
});
