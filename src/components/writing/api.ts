import type { z } from 'zod';
import { ask } from '@/components/api/ask';
import type { CheckResult } from '@/domain/api/schemas/check';
import type { Proposal, SavedProposal } from '@/domain/api/schemas/proposals';
import type { CheckRequest } from '@/domain/api/schemas/check';
import type { SaveProposal } from '@/domain/api/schemas/proposals';
import type { Words } from '@/domain/writing/textChanges';

export { Refused } from '@/components/api/ask';

export const checkSource = (body: z.input<typeof CheckRequest>, signal?: AbortSignal) =>
  ask<CheckResult>('POST', '/check', { body, ...(signal ? { signal } : {}) });

export const readProposal = (id: string) => ask<Proposal>('GET', `/proposals/${id}`);

export const saveProposal = (
  id: string,
  version: number,
  body: z.input<typeof SaveProposal>,
  keepalive = false,
): Promise<SavedProposal> => ask('PUT', `/proposals/${id}`, { body, version, keepalive });

/** Keeps words as a version of the draft without making them the draft's. */
export const setAside = (id: string, words: Words) =>
  ask<undefined>('POST', `/proposals/${id}/versions`, { body: words });

export const submitProposal = (id: string, version: number, key: string) =>
  ask<Proposal>('POST', `/proposals/${id}/submit`, { version, key });

export const discardDraft = (id: string, version: number) => ask<undefined>('DELETE', `/proposals/${id}`, { version });
