import type { ZodError, ZodIssue } from 'zod';
import type { RefusalError } from '../refusal';

const KINDS: Record<string, string> = {
  string: 'text',
  number: 'a number',
  boolean: 'true or false',
  object: 'an object',
  array: 'a list',
};

/** Zod's own messages are for programmers; ours, given in the schemas, are already in plain words. */
function inWords(issue: ZodIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return issue.received === 'undefined' ? 'is missing' : `must be ${KINDS[issue.expected] ?? issue.expected}`;
    case 'invalid_union':
      return unionInWords(issue.unionErrors.flatMap((error) => error.issues));
    case 'unrecognized_keys':
      return `has no ${issue.keys.map((key) => `"${key}"`).join(', ')}; look at the spelling`;
    case 'invalid_enum_value':
      return `must be one of ${issue.options.join(', ')}`;
    case 'too_big':
      return issue.message.startsWith('must') ? issue.message : `must be ${issue.maximum} or less`;
    case 'too_small':
      return /^(must|Write)/.test(issue.message) ? issue.message : `must be ${issue.minimum} or more`;
    case 'invalid_string':
      return issue.message.startsWith('must') ? issue.message : 'is not in the form it must have';
    default:
      return issue.message;
  }
}

/** Several kinds would do: "must be a number or text". What was left out altogether is missing. */
function unionInWords(issues: readonly ZodIssue[]): string {
  const types = issues.flatMap((issue) => (issue.code === 'invalid_type' ? [issue] : []));
  if (types.length > 0 && types.every(({ received }) => received === 'undefined')) return 'is missing';
  // One kind fitted and its own rule did not hold: that rule is what to speak of.
  const inner = issues.find(({ code }) => code !== 'invalid_type');
  if (inner) return inWords(inner);
  const kinds = [...new Set(types.map(({ expected }) => KINDS[expected] ?? expected))];
  return `must be ${kinds.join(' or ')}`;
}

/** What a schema found wrong, as `errors` of a problem document: a dotted path and a sentence's predicate. */
export const fieldErrors = (error: ZodError): RefusalError[] =>
  error.issues.map((issue) => ({ path: issue.path.join('.'), message: inWords(issue) }));
