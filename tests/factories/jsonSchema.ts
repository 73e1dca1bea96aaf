/**
 * What is wrong with a value by a JSON Schema, for the keywords that our schemas use; none of our own code has a part in
 * it. A keyword it does not know is an error, so that nothing is passed over in silence.
 */
type Schema = Record<string, unknown>;

const WORDS = new Set(['$schema', 'description', 'default']);

const typeOf = (value: unknown): string =>
  value === null ? 'null' : Array.isArray(value) ? 'array' : typeof value === 'number' ? 'number' : typeof value;

const KEYWORDS: Record<string, (given: never, value: unknown, schema: Schema, path: string) => string[]> = {
  type: (given: string | string[], value) =>
    [given].flat().some((type) => type === typeOf(value) || (type === 'integer' && Number.isInteger(value)))
      ? []
      : [`must be ${[given].flat().join(' or ')}`],
  enum: (given: unknown[], value) => (given.includes(value) ? [] : ['must be one of a list']),
  const: (given: unknown, value) => (given === value ? [] : ['must be another value']),
  maxLength: (given: number, value) => (typeof value === 'string' && value.length > given ? ['is too long'] : []),
  maxItems: (given: number, value) => (Array.isArray(value) && value.length > given ? ['has too many'] : []),
  minItems: (given: number, value) => (Array.isArray(value) && value.length < given ? ['has too few'] : []),
  anyOf: (given: Schema[], value, _, path) =>
    given.some((one) => schemaProblems(one, value, path).length === 0) ? [] : ['fits none of several'],
  required: (given: string[], value) =>
    given.filter((name) => !Object.hasOwn(Object(value) as object, name)).map((name) => `lacks ${name}`),
  additionalProperties: (given: boolean, value, { properties = {} }) => {
    if (given !== false) throw new Error('Only additionalProperties: false is known here.');
    if (typeOf(value) !== 'object') return [];
    return Object.keys(value as object).flatMap((name) =>
      Object.hasOwn(properties as object, name) ? [] : [`does not know ${name}`],
    );
  },
  properties: (given: Record<string, Schema>, value, _, path) =>
    typeOf(value) === 'object'
      ? Object.entries(given).flatMap(([name, one]) =>
          Object.hasOwn(value as object, name) ? schemaProblems(one, (value as Schema)[name], `${path}.${name}`) : [],
        )
      : [],
  items: (given: Schema, value, _, path) =>
    Array.isArray(value) ? value.flatMap((one, i) => schemaProblems(given, one, `${path}.${i}`)) : [],
};

export function schemaProblems(schema: Schema, value: unknown, path = ''): string[] {
  return Object.entries(schema).flatMap(([keyword, given]) => {
    if (WORDS.has(keyword)) return [];
    const check = KEYWORDS[keyword];
    if (!check) throw new Error(`The schema says ${keyword}, which is not known here.`);
    return check(given as never, value, schema, path).map((problem) =>
      problem.startsWith('.') ? problem : `${path} ${problem}`,
    );
  });
}
