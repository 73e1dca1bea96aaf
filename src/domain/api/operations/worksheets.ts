import { z } from 'zod';
import { VERDICTS } from '@/domain/worksheets/outcome';
import { operation } from '../operation';

const WorksheetName = z
  .string()
  .regex(/^[a-z]+(-[a-z]+)*$/)
  .describe('For example injector-set');

const WorksheetSummary = z.object({
  name: WorksheetName,
  title: z.string(),
  summary: z.string().describe('What it answers, in a sentence'),
});

const BothUnitTexts = z
  .object({ metric: z.string(), inch: z.string() })
  .describe('The same, for readers in metric and in inch units');

const WorksheetResult = z.object({
  key: z.string(),
  label: z.string(),
  value: z.number().nullable().describe('In `unit`, not rounded; null where the answer is no number'),
  unit: z.string().nullable(),
  text: BothUnitTexts,
  verdict: z.enum(VERDICTS).optional(),
  formula: BothUnitTexts.optional().describe('The formula with the numbers in it'),
  source: z.string().optional(),
});

const Params = z.object({ name: z.string() });

export const listWorksheets = operation({
  id: 'listWorksheets',
  method: 'get',
  path: '/worksheets',
  area: 'Measures',
  summary: 'The worksheets that the handbook, sheets and job cards use',
  reply: z.object({ items: z.array(WorksheetSummary) }),
});

export const readWorksheet = operation({
  id: 'readWorksheet',
  method: 'get',
  path: '/worksheets/{name}',
  area: 'Measures',
  summary: 'What a worksheet takes, as JSON Schema, and a worked case to try',
  params: Params,
  reply: WorksheetSummary.extend({
    inputs: z.record(z.unknown()).describe('JSON Schema 2019-09 of the body of the POST'),
    example: z.record(z.unknown()).describe('Inputs that can be posted as they are'),
  }),
});

export const workWorksheet = operation({
  id: 'workWorksheet',
  method: 'post',
  path: '/worksheets/{name}',
  area: 'Measures',
  summary: 'Work out a worksheet; keeps nothing',
  description:
    'A number is in the unit that the schema names; a text may carry any unit of the same kind, such as "14 thou". Rules of thumb that are left out take what the shop has set, else the usual value.',
  params: Params,
  body: z.record(z.unknown()),
  reply: z.object({
    verdict: z
      .enum(VERDICTS)
      .describe('pass and fail against limits; look: worth a second look; none: nothing to judge by'),
    reasons: z.array(z.string()).describe('Sentences in my units, the one that decides first'),
    results: z.array(WorksheetResult),
    understood: z.record(BothUnitTexts).describe('How each measure was read, by the path of its input'),
  }),
});
