import { z } from 'zod';
import { FrontmatterFields, SKILLS } from '../procedure/schema';
import { REVISION_STATES } from '../revision/types';
import { ROLES } from '../people/may';

/** What crosses the wire under `/api/v1`. The OpenAPI document is made from these. Dates are ISO 8601 in UTC. */

export const Id = z.string().uuid().describe('UUIDv7');
export const ProcedureNumber = z
  .string()
  .regex(/^P-\d{4,6}$/)
  .describe('For example P-0142');
export const RevisionLetter = z
  .string()
  .regex(/^[A-HJ-NPRT-WY]{1,2}$/)
  .describe('By ASME Y14.35, for example C');

export const Problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    detail: z.string(),
    errors: z
      .array(
        z.object({ path: z.string(), message: z.string(), line: z.number().optional(), column: z.number().optional() }),
      )
      .optional(),
  })
  .passthrough()
  .describe('RFC 9457 problem document');

export const BookRef = z.object({
  kind: z.enum(['common', 'shop']),
  shopId: z.string().nullable(),
  name: z.string().describe('"Common book" or the name of the shop'),
});

export const UnitSystem = z.enum(['metric', 'inch']);

export const Me = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  units: UnitSystem,
  shortcuts: z.boolean().describe('Single keys, such as / for search, act as shortcuts'),
  shop: z.object({ id: z.string(), name: z.string() }).nullable().describe('The shop the person works in now'),
  roles: z.array(
    z.object({
      in: z.enum(['shop', 'common', 'network']),
      shopId: z.string().nullable(),
      name: z.string(),
      role: z.enum(ROLES),
    }),
  ),
});

export const PersonRef = z.object({ id: z.string(), name: z.string(), shop: z.string().nullable() });

export const RevisionSummary = z.object({
  letter: RevisionLetter,
  state: z.enum(REVISION_STATES),
  hash: z.string().describe('SHA-256 of the canonical text, hex'),
  sheetCheck: z.string().describe('First 8 hex digits of the hash'),
  publishedAt: z.string(),
  reason: z.string(),
  author: PersonRef,
  reviewers: z.array(PersonRef),
});

export const ProcedureSummary = z.object({
  number: ProcedureNumber,
  title: z.string(),
  summary: z.string(),
  book: BookRef,
  system: z.string(),
  engines: z.array(z.string()),
  minutes: z.number(),
  skill: z.enum(SKILLS),
  critical: z.boolean(),
  holds: z.number().int(),
  revision: z.object({ letter: RevisionLetter, hash: z.string(), publishedAt: z.string() }),
});

export const Reference = z.union([
  z.object({ kind: z.literal('torque'), key: z.string(), pass: z.number().int().optional() }),
  z.object({ kind: z.enum(['limit', 'part', 'figure']), key: z.string() }),
  z.object({ kind: z.literal('timer'), key: z.string(), stage: z.enum(['skin-over', 'cure']).optional() }),
  z.object({ kind: z.literal('worksheet'), worksheet: z.string(), keys: z.array(z.string()) }),
]);

export const SheetStep = z.object({
  id: z.string(),
  number: z.number().int(),
  title: z.string(),
  cautions: z.array(z.string()),
  html: z.string(),
  holds: z.array(z.string()),
  references: z.array(Reference),
  text: z.string(),
});

export const Sheet = z.object({
  number: ProcedureNumber,
  title: z.string(),
  book: BookRef,
  revision: RevisionSummary,
  current: z
    .object({ letter: RevisionLetter, publishedAt: z.string() })
    .describe('The revision to work from; the same as `revision` on a current sheet'),
  earlier: z.number().int().describe('How many revisions stand before this one'),
  openProposals: z.number().int().describe('Proposals waiting for review on this procedure'),
  frontmatter: FrontmatterFields,
  introHtml: z.string(),
  steps: z.array(SheetStep),
  source: z.string(),
});

export const SourceProblem = z.object({
  line: z.number().int(),
  column: z.number().int(),
  message: z.string(),
  path: z.string().optional(),
});

/** over: past proof load. unknown: nothing can be said, and the message says why. */
export const ClampVerdict = z.enum(['over', 'low', 'ok', 'unknown']);

export const CheckRequest = z.object({
  source: z.string(),
  preview: z.boolean().optional().describe('Also return the rendered steps'),
});
export const CheckResult = z.object({
  ok: z.boolean(),
  errors: z.array(SourceProblem),
  notices: z.array(SourceProblem),
  clamp: z
    .array(
      z.object({
        key: z.string(),
        name: z.string(),
        path: z.string().describe('`torques.0`'),
        verdict: ClampVerdict,
        message: z.string().describe('The verdict in a sentence'),
        clampLoad: z.number().nullable().describe('N'),
        proofLoad: z.number().nullable().describe('N'),
        share: z.number().nullable().describe('Clamp load over proof load: 0.72 is 72 %'),
        nutFactor: z.number().nullable().describe('K of T = K·d·F'),
        mixUp: z.string().nullable().describe('The unit that the figure may really have been in, in a sentence'),
      }),
    )
    .describe('Clamp check of each torque; empty where the text cannot be read'),
  preview: z.object({ frontmatter: FrontmatterFields, introHtml: z.string(), steps: z.array(SheetStep) }).optional(),
});

/** Lists answer `{items, next}`; `next` is the `cursor` of the following page, null on the last. */
export const ListQuery = z.object({
  cursor: z.string().max(100).optional().describe('`next` of the page before'),
  limit: z.coerce.number().int('must be a whole number').min(1).max(200).default(50),
});
export const pageOf = <T extends z.ZodTypeAny>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable() });

export const UpdateMe = z
  .object({
    name: z.string().trim().min(1, 'must not be empty').max(80, 'must be 80 characters or fewer'),
    units: UnitSystem,
    shortcuts: z.boolean(),
  })
  .partial();
export const ChangePassword = z.object({ current: z.string().max(200), next: z.string().max(200) });

const Reason = z.string().trim().max(4000, 'must be 4000 characters or fewer');
export const StartProcedure = z.object({
  book: z.string().describe('"common" or a shop id'),
  source: z.string(),
  reason: Reason.default(''),
});
export const StartProposal = z.object({ base: RevisionLetter, source: z.string(), reason: Reason.default('') });
export const SaveProposal = z.object({
  source: z.string().optional(),
  reason: Reason.optional(),
  base: RevisionLetter.optional().describe('Say that the text now stands on this revision'),
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
export const Remark = z.object({
  id: z.string(),
  kind: z.enum(['returned', 'declined']),
  person: PersonRef,
  at: z.string(),
  text: z.string(),
  anchor: z.string().nullable(),
});

export const TrailEntry = z.object({
  what: z.enum(['proposed', 'returned', 'declined', 'agreed', 'published']),
  person: PersonRef,
  at: z.string(),
});

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
  takesBack: z
    .array(z.object({ revision: RevisionLetter, what: z.array(z.string()) }))
    .describe('What earlier revisions changed and this sets back to what it was, latest revision first'),
  agreementsNeeded: z.number().int(),
  agreements: z.number().int(),
  createdAt: z.string(),
  updatedAt: z.string(),
  proposedAt: z.string().nullable(),
});

export const Proposal = ProposalSummary.extend({
  source: z.string(),
  agreed: z.array(Agreement),
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
    publish: z.boolean(),
  }),
  whyNot: z.record(z.string()).describe('For an act that is refused: the reason in words'),
});

export const SavedProposal = Proposal.extend({
  check: CheckResult.describe('What is wrong with the saved text, if anything'),
});
export const DeskItem = ProposalSummary.extend({
  next: z.enum(['agree', 'publish', 'wait']).describe('What I can do now; `wait` where others must act first'),
});

const WordRun = z.object({ kind: z.enum(['same', 'removed', 'added']), text: z.string() });
export const Comparison = z.object({
  values: z.array(
    z.object({
      path: z.string(),
      list: z.string(),
      key: z.string().nullable(),
      kind: z.enum(['added', 'removed', 'changed']),
      label: z.string(),
      detail: z.string().nullable(),
      from: z.string().nullable(),
      to: z.string().nullable(),
      percent: z.number().nullable(),
      critical: z.string().nullable(),
    }),
  ),
  clamp: z
    .array(
      z.object({
        key: z.string(),
        name: z.string(),
        from: z.string().nullable(),
        to: z.string().nullable(),
        verdict: ClampVerdict,
        why: z.string(),
        mixUps: z.array(z.string()).describe('Units that may have been mixed up, each a sentence'),
      }),
    )
    .describe('Clamp load then and now of each torque that is new or whose load may have changed'),
  intro: z.array(WordRun),
  steps: z.array(
    z.object({
      id: z.string(),
      kind: z.enum(['same', 'edited', 'added', 'removed']),
      moved: z.boolean(),
      fromNumber: z.number().nullable(),
      toNumber: z.number().nullable(),
      title: z.array(WordRun),
      body: z.array(WordRun),
      cautions: z.object({ from: z.array(z.string()), to: z.array(z.string()) }),
      critical: z.string().nullable(),
    }),
  ),
  criticalReasons: z.array(z.string()),
  identical: z.boolean(),
});

export const CompareQuery = z.object({ from: RevisionLetter, to: RevisionLetter });
export const RevisionComparison = z.object({ from: RevisionSummary, to: RevisionSummary, comparison: Comparison });
export const ProposalComparison = z.object({ base: RevisionLetter.nullable(), comparison: Comparison });

export const MATCHED_FIELDS = [
  'title',
  'summary',
  'torque',
  'limit',
  'timer',
  'part',
  'tool',
  'step',
  'system',
  'text',
] as const;

export const SearchHit = z.object({
  number: ProcedureNumber,
  title: z.string(),
  summary: z.string(),
  engines: z.array(z.string()),
  system: z.string(),
  minutes: z.number(),
  skill: z.enum(SKILLS),
  holds: z.number(),
  letter: RevisionLetter,
  publishedAt: z.string(),
  book: z.string(),
  matched: z
    .array(
      z.object({
        field: z.enum(MATCHED_FIELDS).describe('`text` is the prose of the sheet'),
        text: z.string(),
        step: z.number().int().nullable(),
        marks: z.array(z.tuple([z.number().int(), z.number().int()])).describe('Places in `text`, [start, end)'),
      }),
    )
    .describe('What matched, in words'),
});

const Counts = z.record(z.number().int());
export const SearchQuery = z.object({
  q: z.string().max(200).default('').describe('Words, trade names, measures, a number of a sheet or of a part'),
  engine: z.string().max(2000).default('').describe('Keys of engines, with commas between'),
  system: z.string().max(500).default('').describe('Systems, with commas between'),
  fit: z.string().max(100).default('').describe('Skills the sheet is written for, with commas between'),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});
export const SearchReply = z.object({
  items: z.array(SearchHit).describe('Best first'),
  total: z.number().int().describe('How many sheets there are; `items` may be fewer'),
  near: z.boolean().describe('True where nothing held all of the query and the items only come near'),
  readAs: z.object({
    quantities: z.array(z.string()).describe('Measures that were read, in my units'),
    synonyms: z.array(z.array(z.string())).describe('Trade names that were read, each with its other names'),
  }),
  facets: z.object({ engine: Counts, system: Counts, fit: Counts }).describe('How many sheets each choice would show'),
});

export type Problem = z.infer<typeof Problem>;
export type BookRef = z.infer<typeof BookRef>;
export type UnitSystem = z.infer<typeof UnitSystem>;
export type Me = z.infer<typeof Me>;
export type PersonRef = z.infer<typeof PersonRef>;
export type RevisionSummary = z.infer<typeof RevisionSummary>;
export type ProcedureSummary = z.infer<typeof ProcedureSummary>;
export type Sheet = z.infer<typeof Sheet>;
export type SheetStep = z.infer<typeof SheetStep>;
export type CheckResult = z.infer<typeof CheckResult>;
export type ProposalSummary = z.infer<typeof ProposalSummary>;
export type Remark = z.infer<typeof Remark>;
export type TrailEntry = z.infer<typeof TrailEntry>;
export type Proposal = z.infer<typeof Proposal>;
export type DeskItem = z.infer<typeof DeskItem>;
export type SavedProposal = z.infer<typeof SavedProposal>;
export type ListQuery = z.infer<typeof ListQuery>;
export type Page<T> = { items: T[]; next: string | null };
export type SearchHit = z.infer<typeof SearchHit>;
export type SearchReply = z.infer<typeof SearchReply>;
