import type { Proposal } from '@/domain/api/schemas/proposals';
import { versionTag } from './preconditions';

/** A proposal with its version as ETag, for the `If-Match` of the next call. */
export const tagged = <P extends Proposal>(proposal: P) => ({ body: proposal, tag: versionTag(proposal.version) });

/** The same for one that was just made, with its address. */
export const started = (proposal: Proposal) => ({
  ...tagged(proposal),
  location: `/api/v1/proposals/${proposal.id}`,
});
