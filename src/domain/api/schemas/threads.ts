import { z } from 'zod';
import { Suggestion as ThreadSuggestion } from '../../review/suggestions';
import { THREAD_KINDS } from '../../review/threads';
import { Id, PersonRef } from './common';
import { Photo, PhotoChoices } from './photos';

/** Remarks, questions and suggestions on a proposed text. The OpenAPI document is made from these schemas. */

const Words = z.string().trim().max(4000, 'must be 4000 characters or fewer');
const Written = Words.min(1, 'Write what you want to say');

export const ThreadMessage = z.object({
  id: z.string(),
  person: PersonRef,
  at: z.string(),
  text: z.string(),
  mentions: z.array(z.object({ id: z.string(), name: z.string() })).describe('Who is named in it as `@Name`'),
  photos: z.array(Photo),
});
export type ThreadMessage = z.infer<typeof ThreadMessage>;

export const Thread = z.object({
  id: Id,
  kind: z.enum(THREAD_KINDS),
  anchor: z.string().nullable().describe('`step:<id>`, the path of a value, or null for the whole'),
  place: z.string().describe('What the anchor is called now, or was called where it is gone'),
  gone: z.boolean().describe('True where the text no longer has that step or value'),
  suggestion: ThreadSuggestion.nullable(),
  state: z.enum(['open', 'resolved']),
  answered: z.boolean().describe('Somebody else has written since it was opened'),
  resolvedBy: PersonRef.nullable(),
  resolvedAt: z.string().nullable(),
  acceptedAt: z.string().nullable().describe('When the author took the suggestion up'),
  version: z.number().int(),
  messages: z.array(ThreadMessage).min(1).describe('Oldest first; the first one started it'),
  may: z.object({ reply: z.boolean(), resolve: z.boolean(), reopen: z.boolean(), accept: z.boolean() }),
  whyNot: z.record(z.string()).describe('For an act that is refused: the reason in words'),
});
export type Thread = z.infer<typeof Thread>;

export const ThreadList = z.object({
  items: z.array(Thread).describe('Oldest first'),
  people: z.array(PersonRef).describe('Whom I can name as `@Name`'),
  may: z.object({ start: z.boolean(), suggest: z.boolean() }),
});
export type ThreadList = z.infer<typeof ThreadList>;

export const StartThread = z.object({
  kind: z.enum(THREAD_KINDS),
  anchor: z.string().max(160).nullable().default(null),
  text: Words.default('').describe('May be left out of a suggestion'),
  quote: z.string().max(2000).optional().describe('For words: those of the step that would be replaced, as they stand'),
  replacement: z.string().trim().max(2000).optional(),
  value: z.string().max(300).optional().describe('For a value: what would be written, a number without its unit'),
  photos: PhotoChoices,
});
export type StartThread = z.infer<typeof StartThread>;

export const WriteMessage = z.object({ text: Written, photos: PhotoChoices });
