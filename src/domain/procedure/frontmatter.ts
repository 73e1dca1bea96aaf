import { isAlias, isMap, isScalar, isSeq, LineCounter, parseDocument, visit, type Document } from 'yaml';
import { forbiddenCharacter, forbiddenSentence } from './characters';
import { fieldProblems, sentenceErrors } from './frontmatterProblems';
import { problem, type Place, type PlaceOf } from './problems';
import { Frontmatter } from './schema';
import type { SourceProblem } from './types';

export type FrontmatterRead =
  { ok: true; frontmatter: Frontmatter; placeOf: PlaceOf } | { ok: false; errors: SourceProblem[] };

/** A value to point at; an empty one has no width, and a list of fields starts where its first field does. */
const isFilled = (value: unknown) => (isScalar(value) && value.value !== null) || isSeq(value);

function placesOf(
  document: Document,
  lines: LineCounter,
  before: number,
): { placeOf: PlaceOf; at: (o: number) => Place } {
  const at = (offset: number): Place => {
    const { line, col } = lines.linePos(offset);
    return { line: line + before, column: Math.max(1, col) };
  };
  const placeOf: PlaceOf = (path, part = 'value') => {
    for (let length = path.length; length > 0; length -= 1) {
      const parent = document.getIn(path.slice(0, length - 1), true);
      const last = path[length - 1];
      if (isMap(parent)) {
        const pair = parent.items.find((item) => isScalar(item.key) && item.key.value === last);
        const node = part === 'value' && isFilled(pair?.value) ? pair?.value : pair?.key;
        const range = (node as { range?: [number, number, number] } | undefined)?.range;
        if (range) return at(range[0]);
      } else if (isSeq(parent)) {
        const range = (parent.items[Number(last)] as { range?: [number, number, number] } | undefined)?.range;
        if (range) return at(range[0]);
      }
    }
    return { line: 1 + before, column: 1 };
  };
  return { placeOf, at };
}

/** Larger or finer than anything that is measured in a shop; such numbers also lose digits when converted. */
function numberFault(value: number): string | null {
  if (!Number.isFinite(value)) return 'This is no number that can be measured. Write a plain number.';
  if (Math.abs(value) > 1e9) return 'This number is larger than anything that is measured here.';
  return Number(value.toFixed(6)) === value
    ? null
    : 'This number has more than six decimals. Round it to what can be measured.';
}

/** What YAML allows and a procedure does not: aliases, anchors, tags, and numbers that nobody can measure. */
function refused(document: Document, at: (offset: number) => Place): SourceProblem[] {
  const errors: SourceProblem[] = [];
  visit(document, {
    Node: (_, node) => {
      const place = at(node.range?.[0] ?? 0);
      if (isAlias(node) || ('anchor' in node && node.anchor))
        errors.push(
          problem(
            place,
            'Signs & and * that point at another value are not used here. Write the value out, in quotes if it starts with such a sign.',
          ),
        );
      else if (node.tag && node.tag.startsWith('!') === true)
        errors.push(problem(place, 'A value that starts with ! needs quotes.'));
      else if (isScalar(node) && typeof node.value === 'number') {
        const fault = numberFault(node.value);
        if (fault) errors.push(problem(place, fault));
      } else if (isScalar(node) && typeof node.value === 'string') {
        const found = forbiddenCharacter(node.value.replace(/\n/g, ' '));
        if (found) errors.push(problem(place, forbiddenSentence(found.what)));
      }
    },
  });
  return errors;
}

const YAML_SENTENCES: Partial<Record<string, string>> = {
  DUPLICATE_KEY: 'This field is written twice in the same entry. Keep one of them.',
  BAD_INDENT: 'This line does not stand under the one it belongs to. Indent with two spaces.',
  TAB_AS_INDENT: 'A tab stands where spaces must. Indent with two spaces.',
  MULTIPLE_DOCS: 'A line of three hyphens or dots divides the front matter here. Remove it.',
  UNEXPECTED_TOKEN: 'This line cannot be read. A field is written as name: value.',
  MISSING_CHAR: 'Something is missing here: a quote, a bracket or a colon followed by a space.',
  BLOCK_AS_IMPLICIT_KEY: 'This value has a colon in it that reads as a field. Put the whole value in double quotes.',
  MULTILINE_IMPLICIT_KEY: 'This line cannot be read. A field is written as name: value, on one line.',
};

/**
 * YAML of a front matter to the typed object. `before` is the number of lines ahead of the YAML.
 * Core schema only: no merge keys, no aliases, no tags, each key once.
 */
export function readFrontmatter(yaml: string, before: number): FrontmatterRead {
  const lines = new LineCounter();
  const document = parseDocument(yaml, {
    version: '1.2',
    schema: 'core',
    merge: false,
    uniqueKeys: true,
    stringKeys: true,
    prettyErrors: false,
    lineCounter: lines,
    logLevel: 'silent',
  });
  const { placeOf, at } = placesOf(document, lines, before);
  const unread = [...document.errors, ...document.warnings].map((e) =>
    problem(at(e.pos[0]), YAML_SENTENCES[e.code] ?? 'This line cannot be read. A field is written as name: value.'),
  );
  if (unread.length) return { ok: false, errors: unread };
  const notUsed = refused(document, at);
  if (notUsed.length) return { ok: false, errors: notUsed };
  const value: unknown = document.toJS({ maxAliasCount: 0 });
  if (!isMap(document.contents))
    return {
      ok: false,
      errors: [problem(placeOf([]), 'The front matter is empty. Start it with title: and the name of the task.')],
    };
  const result = Frontmatter.safeParse(value, { errorMap: sentenceErrors });
  if (!result.success) return { ok: false, errors: fieldProblems(result.error.issues, value, placeOf) };
  return { ok: true, frontmatter: result.data, placeOf };
}
