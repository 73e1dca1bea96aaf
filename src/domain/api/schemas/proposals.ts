import { z } from 'zod';
import { REVISION_STATES } from '../../revision/types';
import { Id, ProcedureNumber, RevisionLetter, BookRef, PersonRef } from './common';
import { CheckResult } from './check';
import { Severity } from './compare';
import { Origin } from './imports';
import { Photo } from './photos';

/** A text on its way: how it is started, saved and judged. The OpenAPI document is made from these schemas. */

const Reason = z.string().trim().max(4000, 'must be 4000 characters or fewer');

export const StartProcedure = z.object({
  book: z.string().describe('"common" or a shop id'),
  source: z.string(),
  reason: Reason.default(''),
  origin: Origin.optional().describe('What it was begun from; kept with the draft, and told to whoever reviews it'),
});

export const StartProposal = z.object({ base: RevisionLetter, source: z.string(), reason: Reason.default('') });

export const SaveProposal = z.object({
  source: z.string().optional(),
  reason: Reason.optional(),
  base: RevisionLetter.optional().describe('Say that the text now stands on this revision'),
  page: z
    .string()
    .max(40)
    .optional()
    .describe('Names the page that writes: saves of one page are thinned together as they grow old'),
});

export const GiveReason = z.object({
  reason: z.string().trim().min(1, 'Write why, so that the author can act on it').max(4000),
  anchor: z.string().max(120).nullable().default(null).describe('`step:<id>` or the path of a value'),
});

export const Agreement = z.object({
  person: PersonRef,
  at: z.string(),
  stands: z.boolean().describe('False once the text changed after it'),
});

const Share = z.number().describe('Clamp load over proof load: 1.23 is 123 %');

export const GiveOverride = z.object({
  torque: z.string().max(120).describe('Key of a torque that fails the clamp check'),
  reason: z.string().trim().min(1, 'Write why this torque is right all the same').max(4000),
});

export const FailingTorque = z.object({
  key: z.string(),
  name: z.string(),
  share: Share,
  override: z
    .object({ person: PersonRef, reason: z.string(), at: z.string() })
    .nullable()
    .describe('The one that stands: to this text, by an editor of the book; null blocks publishing'),
});
export type FailingTorque = z.infer<typeof FailingTorque>;

export const Remark = z.object({
  id: z.string(),
  kind: z.enum(['returned', 'declined']),
  person: PersonRef,
  at: z.string(),
  text: z.string(),
  anchor: z.string().nullable(),
});
export type Remark = z.infer<typeof Remark>;

export const TrailEntry = z.object({
  what: z.enum(['proposed', 'returned', 'declined', 'agreed', 'overrode', 'published']),
  person: PersonRef,
  at: z.string(),
});
export type TrailEntry = z.infer<typeof TrailEntry>;

export const ProposalSummary = z.object({
  id: Id,
  number: ProcedureNumber,
  title: z.string(),
  book: BookRef,
  state: z.enum(REVISION_STATES),
  version: z.number().int(),
  base: RevisionLetter.nullable().describe('null for a new procedure'),
  stale: z.boolean().describe('True where a later revision than the base is published'),
  author: PersonRef,
  reason: z.string(),
  critical: z.boolean(),
  criticalReasons: z.array(z.string()),
  severity: Severity,
  takesBack: z
    .array(z.object({ revision: RevisionLetter, what: z.array(z.string()) }))
    .describe('What earlier revisions changed and this sets back to what it was, latest revision first'),
  agreementsNeeded: z.number().int(),
  agreements: z.number().int(),
  createdAt: z.string(),
  updatedAt: z.string(),
  proposedAt: z.string().nullable(),
});
export type ProposalSummary = z.infer<typeof ProposalSummary>;

export const Proposal = ProposalSummary.extend({
  source: z.string(),
  photos: z.array(Photo).describe('Evidence that belongs to the reason'),
  origin: Origin.nullable().describe('What a new procedure was begun from; null where it was written from nothing'),
  agreed: z.array(Agreement),
  failing: z
    .array(FailingTorque)
    .describe('Torques past proof load that are new or whose load changes; each needs an override'),
  remarks: z.array(Remark),
  trail: z.array(TrailEntry).describe('What became of it since it was first sent in, oldest first'),
  currentLetter: RevisionLetter.nullable(),
  publishedLetter: RevisionLetter.nullable().describe('Set once published'),
  may: z.object({
    edit: z.boolean(),
    submit: z.boolean(),
    return: z.boolean(),
    decline: z.boolean(),
    agree: z.boolean(),
    override: z.boolean().describe('Of the clamp check, for the torques that are still open'),
    publish: z.boolean(),
  }),
  whyNot: z.record(z.string()).describe('For an act that is refused: the reason in words'),
});
export type Proposal = z.infer<typeof Proposal>;

export const SavedProposal = Proposal.extend({
  check: CheckResult.describe('What is wrong with the saved text, if anything'),
});
export type SavedProposal = z.infer<typeof SavedProposal>;

export const DeskItem = ProposalSummary.extend({
  next: z
    .enum(['agree', 'override', 'publish', 'wait'])
    .describe('What I can do now; `wait` where others must act first'),
});
export type DeskItem = z.infer<typeof DeskItem>;
