import { capital } from '../wording';
import type { ZodErrorMap, ZodIssue } from 'zod';
import { ENTRY_FIELDS, ENTRY_WORDS, HEAD_FIELDS, isListName } from './fields';
import { nearest } from './nearest';
import { MOST_SHOWN, problem, type PlaceOf } from './problems';
import type { SourceProblem } from './types';

const KINDS: Partial<Record<string, string>> = {
  string: 'text',
  number: 'a number',
  boolean: 'true or false',
  array: 'a list',
  object: 'an entry with fields',
};

function wrongType(expected: string, received: string, data: unknown): string {
  if (received === 'undefined') return expected === 'array' ? 'are missing' : 'is missing';
  if (received === 'null') return 'is empty: fill it in or remove the line';
  if (expected === 'string' && (received === 'number' || received === 'boolean'))
    return `must be text: put it in quotes, "${String(data)}"`;
  if (expected === 'number' && typeof data === 'string')
    return /\d/.test(data)
      ? `must be a number alone, without its unit; "${data.slice(0, 40)}" is text`
      : `must be a number; "${data.slice(0, 40)}" is text`;
  return `must be ${KINDS[expected] ?? expected}`;
}

/** Zod's own findings as the second half of a sentence; the schema's own messages stay as they are. */
export const sentenceErrors: ZodErrorMap = (issue, { data, defaultError }) => {
  switch (issue.code) {
    case 'invalid_type':
      return { message: wrongType(issue.expected, issue.received, data) };
    case 'invalid_enum_value':
      return { message: `must be one of ${issue.options.join(', ')}` };
    case 'too_small':
      return {
        message:
          issue.type === 'number'
            ? `must be ${issue.inclusive ? `${issue.minimum} or more` : `more than ${issue.minimum}`}`
            : `must have at least ${issue.minimum} ${issue.type === 'array' ? 'entries' : 'characters'}`,
      };
    case 'too_big':
      return {
        message:
          issue.type === 'number'
            ? `must be ${issue.inclusive ? `${issue.maximum} or less` : `less than ${issue.maximum}`}`
            : `must have ${issue.maximum} ${issue.type === 'array' ? 'entries' : 'characters'} or fewer`,
      };
    default:
      return { message: defaultError };
  }
};

const followsItsField = (message: string) => /^(must|is|are|needs|belongs|points|names|"|has)\b|^"/.test(message);

/** "Torque 1 (Cover bolt)" or null for a field of the head. */
function entryWords(path: readonly (string | number)[], value: unknown): string | null {
  const [list, index] = path;
  if (!isListName(list) || typeof index !== 'number') return null;
  const entry = (value as Record<string, unknown[]>)[list]?.[index] as Record<string, unknown> | undefined;
  const name = entry?.['name'] ?? entry?.['title'] ?? entry?.['hazard'] ?? entry?.['caption'];
  const called = typeof name === 'string' && name.trim() ? ` (${name.trim().slice(0, 60)})` : '';
  return `${ENTRY_WORDS[list]} ${index + 1}${called}`;
}

/** "tolerance", "passes, number 2", "bench time". */
function fieldWords(path: readonly (string | number)[]): string {
  const [list, index, field, place] = path;
  if (isListName(list) && typeof index === 'number') {
    const words =
      (ENTRY_FIELDS[list] as Record<string, string>)[String(field)] ?? (field === undefined ? '' : String(field));
    return typeof place === 'number' ? `${words}, number ${place + 1},` : words;
  }
  const words = (HEAD_FIELDS as Record<string, string>)[String(list)] ?? String(list ?? '');
  return typeof index === 'number' ? `${words}, number ${index + 1},` : words;
}

function sentence(path: readonly (string | number)[], message: string, value: unknown): string {
  const field = fieldWords(path);
  const said = field === '' ? message : followsItsField(message) ? `${field} ${message}` : `${field}: ${message}`;
  const entry = entryWords(path, value);
  return `${entry ? `${entry}: ${said}` : capital(said)}.`;
}

function unknownField(path: readonly (string | number)[], name: string, value: unknown): string {
  const [list] = path;
  const known = Object.keys(path.length > 0 && isListName(list) ? ENTRY_FIELDS[list] : HEAD_FIELDS);
  const near = nearest(name, known);
  const help = near ? `Did you mean "${near}"?` : `There is ${known.join(', ')}.`;
  const entry = entryWords(path, value);
  return `${entry ? `${entry}: there` : 'There'} is no field "${name.slice(0, 60)}". ${help}`;
}

/** Findings of the schema as sentences that name the field in words, each at its place in the text. */
export function fieldProblems(issues: readonly ZodIssue[], value: unknown, placeOf: PlaceOf): SourceProblem[] {
  return issues.flatMap((issue) => {
    if (issue.code === 'unrecognized_keys')
      return issue.keys.slice(0, MOST_SHOWN).map((name) => {
        const path = [...issue.path, name];
        return problem(placeOf(path, 'name'), unknownField(issue.path, name, value), path.join('.'));
      });
    return [problem(placeOf(issue.path), sentence(issue.path, issue.message, value), issue.path.join('.'))];
  });
}
