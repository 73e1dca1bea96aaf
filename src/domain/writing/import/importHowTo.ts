import type { PhrasingContent, Root, RootContent } from 'mdast';
import type { ImportedSheet, ImportFigure, LeftOut } from '../../api/schemas/imports';
import { toSource } from '../../procedure/canonical';
import { FILL_IN } from '../../procedure/fillIn';
import { writeMarkdown } from '../../procedure/markdown';
import { parseProcedure } from '../../procedure/parse';
import { figuresInProse } from '../../procedure/proseFigures';
import type { Parsed, Procedure } from '../../procedure/types';
import { sentencesOf } from './cautionWords';
import { fromHtml } from './fromHtml';
import { paragraphOf, textNode, tidy, wordsOf } from './nodes';
import { readPlainMarkdown } from './plainMarkdown';
import { sheetOf, type DraftSheet } from './sheet';
import { countedWords, wordsMissing } from './words';

export type Imported = { ok: true; imported: ImportedSheet } | { ok: false; message: string; line?: number };

/** Bytes that a draft and the list of what it could not take may have together: what a call of the API can carry. */
const MOST_BYTES = 65_536;
const MOST_LEFT_OUT = 600;
/** HTML of a document that is larger holds more words than a sheet can, whatever they are. */
const MOST_HTML = 1_500_000;

const bytes = (text: string) => new TextEncoder().encode(text).length;
const TOO_LARGE =
  'This document holds more than fits into one sheet (64 KB of text). Divide it, and import each part by itself.';
const no = (message: string, line?: number): Imported => ({
  ok: false,
  message,
  ...(line === undefined ? {} : { line }),
});

/** Blocks as bare paragraphs, for a passage whose formatting cannot be written. */
function bare(nodes: readonly RootContent[]): RootContent[] {
  return nodes.flatMap((node): RootContent[] => {
    if ('children' in node && ['list', 'listItem', 'blockquote', 'table'].includes(node.type))
      return bare(node.children as RootContent[]);
    if (node.type === 'tableRow') {
      const text = tidy(node.children.map((cell) => wordsOf(cell.children)).join('; '));
      return text ? [paragraphOf(textNode(text))] : [];
    }
    const text = tidy('children' in node ? wordsOf(node.children as PhrasingContent[]) : wordsOf(node));
    return text ? [paragraphOf(textNode(text))] : [];
  });
}

const written = ({ head, intro, steps }: DraftSheet): Procedure => ({
  frontmatter: head,
  intro: writeMarkdown(intro),
  steps: steps.map(({ children, ...step }) => ({ ...step, body: writeMarkdown(children) })),
});

/** Writes the sheet out and reads it again; a passage that cannot be written as it is formatted is written bare. */
function settle(sheet: DraftSheet): Parsed {
  const simplified = new Set<string>();
  for (;;) {
    const parsed = parseProcedure(toSource(written(sheet)));
    if (parsed.ok) return parsed;
    const place = parsed.errors
      .map(({ path }) => path ?? '')
      .find((path) => /^(intro|steps\.\d+\.body)$/.test(path) && !simplified.has(path));
    if (place === undefined || simplified.size > 40) return parsed;
    simplified.add(place);
    const step = sheet.steps[Number(place.split('.')[1])];
    sheet.leftOut.push({
      what: 'Formatting',
      where: step ? `step ${sheet.steps.indexOf(step) + 1}: ${step.title}`.slice(0, 200) : 'the introduction',
      quote: '',
      became: 'plain paragraphs',
    });
    if (step) step.children = bare(step.children);
    else sheet.intro = bare(sheet.intro);
  }
}

function linesOf(nodes: readonly RootContent[]): string[] {
  return nodes.flatMap((node): string[] => {
    if (node.type === 'paragraph' || node.type === 'tableCell') return [tidy(wordsOf(node.children))];
    return 'children' in node ? linesOf(node.children as RootContent[]) : [];
  });
}

/** Numbers with a unit that stand in words, with the step and the sentence, for the author to make into values. */
function figuresOf({ head, intro, steps }: DraftSheet): ImportFigure[] {
  const inText = (step: string, text: string): ImportFigure[] =>
    sentencesOf(text).flatMap((quote) =>
      figuresInProse(quote).map(({ text: number, list }) => ({
        step,
        text: number,
        quote,
        list: list as ImportFigure['list'],
      })),
    );
  return [
    ...linesOf(intro).flatMap((text) => inText('the introduction', text)),
    ...steps.flatMap(({ title, cautions, children }) => [
      ...inText(title, title),
      ...head.cautions
        .filter(({ key }) => cautions.includes(key))
        .flatMap(({ hazard, harm, avoid }) => [hazard, harm, avoid].flatMap((text) => inText(title, text))),
      ...linesOf(children).flatMap((text) => inText(title, text)),
    ]),
  ];
}

/** Everything of a sheet that came from the document: no marker, no key, no id. */
function takenWords({ head, steps }: DraftSheet, { intro, steps: bodies }: Procedure): string {
  const strings = (value: unknown, field = ''): string[] =>
    typeof value === 'string'
      ? [value]
      : typeof value === 'number'
        ? [String(value)]
        : typeof value === 'object' && value !== null
          ? Object.entries(value).flatMap(([name, inside]) => (name === 'key' ? [] : strings(inside, field)))
          : [];
  const own = strings([
    head.title,
    head.parts.map(({ action: _, ...part }) => part),
    head.tools,
    head.supplies,
    head.cautions,
    steps.map(({ title }) => title),
  ]);
  const plain = own.map((text) => text.replace(new RegExp(`${FILL_IN}.*$`), ' '));
  return [...plain, intro, ...bodies.map(({ body }) => body)].join('\n');
}

const MERGED = [
  'HTML',
  'Unseen characters',
  'Mark of a footnote',
  'Number typed by hand',
  'Tracked change: words put in',
  'Tracked change: words taken out',
];

/** One entry for many small ones of a kind in one place. */
function gathered(items: readonly LeftOut[]): LeftOut[] {
  const out: LeftOut[] = [];
  for (const item of items) {
    const last = out.at(-1);
    if (last && MERGED.includes(item.what) && last.what === item.what && last.where === item.where)
      last.quote = `${last.quote} ${item.quote}`;
    else out.push({ ...item });
  }
  return out;
}

/** What a tree and the words of its document come to. */
function imported(root: Root, words: string, also: readonly LeftOut[]): Imported {
  if (countedWords(words).length === 0) return no('There are no words in this document.');
  const sheet = sheetOf(root);
  sheet.leftOut.push(...also);
  const parsed = settle(sheet);
  if (!parsed.ok) {
    const [first] = parsed.errors;
    return no(
      first && /64 KB|2,000 lines/.test(first.message)
        ? TOO_LARGE
        : `This document cannot be made into a sheet. ${first?.message ?? ''}`.trim(),
    );
  }
  const { procedure, canonical } = parsed;
  const missing = wordsMissing(
    words,
    `${takenWords(sheet, procedure)}\n${sheet.leftOut.map(({ quote }) => quote).join('\n')}`,
  );
  if (missing.length)
    sheet.leftOut.push({
      what: 'Words without a place',
      where: 'the document',
      quote: missing.join(' '),
      became: null,
    });
  const leftOut = gathered(sheet.leftOut);
  const listed = leftOut.reduce((sum, { quote, where, what }) => sum + bytes(quote + where + what), 0);
  if (leftOut.length > MOST_LEFT_OUT || bytes(canonical) + listed > MOST_BYTES) return no(TOO_LARGE);
  return {
    ok: true,
    imported: {
      source: canonical,
      title: procedure.frontmatter.title,
      steps: procedure.steps.map(({ id, title, cautions }) => ({ id, title, cautions: cautions.length })),
      cautions: procedure.frontmatter.cautions.map(({ key, ...caution }) => ({
        ...caution,
        steps: procedure.steps.flatMap((step, i) => (step.cautions.includes(key) ? [i + 1] : [])),
      })),
      figures: figuresOf(sheet),
      leftOut,
    },
  };
}

/** A sheet that was taken out of a book as text comes in as it is. */
function ownText(text: string): Imported | null {
  const parsed = /^---\n/.test(text) ? parseProcedure(text) : null;
  if (!parsed?.ok) return null;
  const { procedure, canonical } = parsed;
  const { frontmatter, steps } = procedure;
  return {
    ok: true,
    imported: {
      source: canonical,
      title: frontmatter.title,
      steps: steps.map(({ id, title, cautions }) => ({ id, title, cautions: cautions.length })),
      cautions: frontmatter.cautions.map(({ key, ...caution }) => ({
        ...caution,
        steps: steps.flatMap((step, i) => (step.cautions.includes(key) ? [i + 1] : [])),
      })),
      figures: [],
      leftOut: [],
    },
  };
}

/** Words of Markdown without what its own signs are made of: numbers of points, names of characters. */
const markdownWords = (text: string) =>
  text.replace(/&#?\w{1,32};/g, ' ').replace(/^[\s>*+-]*\d{1,9}[.)](?=\s)/gm, ' ');

/** A how-to in Markdown as a draft. Pure and bounded; what cannot be read is refused in a sentence, with its line. */
export function importMarkdown(source: string): Imported {
  const read = readPlainMarkdown(source);
  if ('problem' in read) return no(read.problem.message, read.problem.line);
  return ownText(read.text) ?? imported(read.root, markdownWords(read.text), []);
}

/**
 * A how-to that was turned into HTML, as a draft.
 *
 * @param words all words of the document, read without the HTML, so that none is lost on the way
 * @param leftOut what never came into the HTML
 */
export function importHtml(html: string, words: string, leftOut: readonly LeftOut[]): Imported {
  if (html.length > MOST_HTML || bytes(words) > 4 * MOST_BYTES) return no(TOO_LARGE);
  return imported(fromHtml(html), words, leftOut);
}
