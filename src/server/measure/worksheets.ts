import { zodToJsonSchema } from 'zod-to-json-schema';
import type { Actor } from '@/domain/people/may';
import { inputSchema } from '@/domain/worksheets/inputSchema';
import type { Outcome } from '@/domain/worksheets/outcome';
import type { RawInputs } from '@/domain/worksheets/readInputs';
import { WORKSHEETS, worksheetNamed } from '@/domain/worksheets/registry';
import { nest } from '@/domain/worksheets/typedIn';
import { workOut, type WorkedOut } from '@/domain/worksheets/work';
import type { Worksheet } from '@/domain/worksheets/worksheet';
import { fieldErrors } from '../http/fieldErrors';
import { invalid, notFound } from '../refusal';
import { shopRules } from './rules';

const summaryOf = ({ name, title, summary }: Worksheet) => ({ name, title, summary });

export const listWorksheets = () => WORKSHEETS.map(summaryOf);

function found(name: string): Worksheet {
  const worksheet = worksheetNamed(name);
  if (!worksheet) throw notFound('There is no such worksheet.');
  return worksheet;
}

/** What a worksheet takes and a case to try; 404 where there is none of that name. */
export function describeWorksheet(name: string) {
  const worksheet = found(name);
  const inputs = zodToJsonSchema(inputSchema(worksheet.fields), { target: 'jsonSchema2019-09', $refStrategy: 'none' });
  return {
    ...summaryOf(worksheet),
    inputs: inputs as Record<string, unknown>,
    example: withoutBlanks(nest(worksheet.fields, worksheet.example)),
  };
}

const withoutBlanks = (value: unknown): never => JSON.parse(JSON.stringify(value)) as never;

/**
 * Works out a worksheet by the rules of thumb of the actor's shop, and keeps nothing. Anybody signed in may.
 *
 * @throws Refusal 404 for an unknown worksheet; 422 with the path of each input that cannot be used
 */
export async function workWorksheet(
  actor: Actor,
  name: string,
  body: RawInputs,
): Promise<Omit<WorkedOut, 'outcome'> & { outcome: Outcome }> {
  const worksheet = found(name);
  const shape = inputSchema(worksheet.fields).safeParse(body);
  if (!shape.success) throw invalid('Some inputs cannot be used.', fieldErrors(shape.error));
  const { outcome, understood } = workOut(worksheet, body, { rules: await shopRules(actor, worksheet) });
  if (!outcome.ok)
    throw invalid(
      'Some inputs cannot be used.',
      outcome.problems.map(({ field, message }) => ({ path: field, message })),
    );
  return { outcome: outcome.value, understood };
}
