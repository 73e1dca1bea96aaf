import { capital } from '../wording';

/** What was done, as the trail is read. An act that is not named here is told by its own name. */
const ACTS: Record<string, string> = {
  'proposal.started': 'Started a draft',
  'proposal.saved': 'Saved a draft',
  'proposal.discarded': 'Threw a draft away',
  'proposal.submitted': 'Proposed a text',
  'proposal.returned': 'Returned a proposal',
  'proposal.declined': 'Declined a proposal',
  'proposal.agreed': 'Agreed to a proposal',
  'proposal.overridden': 'Overrode the clamp check',
  'proposal.restored': 'Went back to an earlier version of a draft',
  'proposal.evidence': 'Chose the photos of a reason',
  'thread.started': 'Wrote about a proposal',
  'thread.answered': 'Answered about a proposal',
  'thread.accepted': 'Took a suggestion up',
  'thread.resolved': 'Closed a question or remark',
  'thread.reopened': 'Opened a question or remark again',
  'revision.published': 'Published a revision',
  'procedure.withdrawn': 'Withdrew a sheet',
  'procedure.brought-back': 'Brought a sheet back',
  'bulletin.signed': 'Read and signed a bulletin',
  'flag.raised': 'Raised a flag',
  'flag.answered': 'Answered a flag',
  'flag.taken-up': 'Took a flag up',
  'flag.withdrawn': 'Took a flag back',
  'photo.removed': 'Removed a photo',
  'feed.made': 'Made a key for a feed',
  'feed.replaced': 'Replaced the key of a feed',
  'feed.revoked': 'Revoked the key of a feed',
  'shop.rule-set': 'Set a rule of thumb',
  'shop.rule-cleared': 'Cleared a rule of thumb',
  'person.added': 'Added a person',
  'person.password-changed': 'Changed their password',
  'person.signed-out-everywhere': 'Signed out everywhere',
  'person.renamed': 'Changed their name',
};

/** "procedure.put-away" is "Procedure, put away". */
export const actWords = (act: string): string => ACTS[act] ?? capital(act.replace('.', ', ').replaceAll('-', ' '));

/** The part of an entry's detail that a reader wants: the reason that was given. */
export const reasonIn = (detail: Record<string, unknown>): string | null =>
  typeof detail['reason'] === 'string' && detail['reason'].trim() ? detail['reason'].trim() : null;
