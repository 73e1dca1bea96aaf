import { z } from 'zod';
import { FLAG_KINDS, FLAG_STATES, type FlagKind } from '@/domain/flags/flags';
import { operation } from '../operation';
import { Photo, PhotoChoices } from '../schemas/photos';
import { BookRef, Id, PersonRef, ProcedureNumber, RevisionLetter } from '../schemas/common';

const KINDS = Object.keys(FLAG_KINDS) as [FlagKind, ...FlagKind[]];

const Flag = z.object({
  id: Id,
  number: ProcedureNumber,
  title: z.string(),
  book: BookRef,
  letter: RevisionLetter.describe('The revision that was on the screen'),
  step: z
    .object({ id: z.string(), title: z.string(), number: z.number().int().nullable() })
    .nullable()
    .describe('null: about the whole sheet; `number` is null where the step is no longer in the current text'),
  kind: z.enum(KINDS),
  text: z.string(),
  photos: z.array(Photo),
  raisedBy: PersonRef,
  raisedAt: z.string(),
  state: z.enum(FLAG_STATES),
  endedBy: PersonRef.nullable(),
  endedAt: z.string().nullable(),
  answer: z.string(),
  proposal: z.object({ id: Id, state: z.string(), letter: z.string().nullable() }).nullable(),
  seen: z.boolean().describe('Whether the person who raised it has seen how it ended'),
});

/** What acting on one flag takes and answers, whichever the act. */
const onFlag = {
  method: 'post',
  area: 'Book',
  params: z.object({ id: Id }),
  status: 200,
  reply: Flag,
  refuses: [403, 404, 409],
} as const;

export const raiseFlag = operation({
  id: 'raiseFlag',
  method: 'post',
  path: '/procedures/{number}/flags',
  area: 'Book',
  summary: 'Say that something is wrong, unclear or missing on the current sheet',
  params: z.object({ number: ProcedureNumber }),
  body: z
    .object({
      step: z.string().max(80).nullish().describe('Id of the step; left out for the whole sheet'),
      kind: z.enum(KINDS),
      text: z.string(),
      photos: PhotoChoices,
    })
    .strict(),
  status: 201,
  reply: Flag,
});

export const listFlags = operation({
  id: 'listFlags',
  method: 'get',
  path: '/flags',
  area: 'Book',
  summary: 'Flags that wait for my answer, the oldest first, and those that I raised',
  reply: z.object({ toAnswer: z.array(Flag), mine: z.array(Flag) }),
});

export const answerFlag = operation({
  ...onFlag,
  id: 'answerFlag',
  path: '/flags/{id}/answer',
  summary: 'Answer a flag; whoever raised it is told',
  body: z.object({ text: z.string() }).strict(),
});

export const takeUpFlag = operation({
  ...onFlag,
  id: 'takeUpFlag',
  path: '/flags/{id}/take-up',
  summary: 'Start a draft of a change from a flag; `proposal` names it',
});

export const withdrawFlag = operation({
  ...onFlag,
  id: 'withdrawFlag',
  path: '/flags/{id}/withdraw',
  summary: 'Take back a flag of my own',
});
