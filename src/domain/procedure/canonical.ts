import { Document, isSeq, visit } from 'yaml';
import { ENTRY_FIELDS, HEAD_FIELDS, isListName } from './fields';
import type { Frontmatter } from './schema';
import type { Procedure, Step } from './types';

/**
 * A procedure as text, always the same text for the same procedure. Light: the writing form calls it
 * on every change. What it writes is canonical where `intro` and each `body` are; for text as it was
 * typed, `parseProcedure(toSource(p)).canonical` is the settled form.
 */

const isEmpty = (value: unknown) =>
  value === undefined || value === null || value === false || (Array.isArray(value) && value.length === 0);

/** The fields of `value` that are set, in the order of `fields`. `min: 0` is set; `critical: false` is not. */
function inFieldOrder(value: object, fields: object): Record<string, unknown> {
  const given = value as Record<string, unknown>;
  return Object.fromEntries(
    Object.keys(fields)
      .filter((name) => Object.hasOwn(given, name) && !isEmpty(given[name]))
      .map((name) => [name, given[name]]),
  );
}

/** The front matter as YAML, without its fences. Numbers stand on one line with their list. */
export function frontmatterSource(frontmatter: Frontmatter): string {
  const head = inFieldOrder(frontmatter, HEAD_FIELDS);
  for (const [name, value] of Object.entries(head))
    if (isListName(name)) head[name] = (value as object[]).map((entry) => inFieldOrder(entry, ENTRY_FIELDS[name]));
  const document = new Document(head, { aliasDuplicateObjects: false });
  visit(document, {
    Pair: (_, pair) => {
      const name = String(pair.key);
      if (isSeq(pair.value) && !isListName(name) && name !== 'engines') pair.value.flow = true;
    },
  });
  return document.toString({ lineWidth: 0, flowCollectionPadding: false });
}

/** A double-quoted attribute value. An ampersand is written out only where it would start a character reference. */
function quoted(value: string): string {
  const escaped = value
    .replace(/&(?=#?\w+;)/g, '&amp;')
    .replace(/"/g, '&quot;')
    .replace(/[\r\n]+/g, ' ');
  return `"${escaped}"`;
}

export function stepSource(step: Step): string {
  const cautions = step.cautions.map((key) => `<Caution of=${quoted(key)} />`).join('\n');
  const inside = [cautions, step.body.trim()].filter(Boolean).join('\n\n');
  const open = `<Step id=${quoted(step.id)} title=${quoted(step.title)}>`;
  return inside ? `${open}\n${inside}\n</Step>` : `${open}\n</Step>`;
}

/** The whole text of a procedure: front matter, introduction, steps; ends with one line end. */
export function toSource(procedure: Procedure): string {
  const body = [procedure.intro.trim(), ...procedure.steps.map(stepSource)].filter(Boolean).join('\n\n');
  return `---\n${frontmatterSource(procedure.frontmatter)}---\n\n${body}\n`;
}
