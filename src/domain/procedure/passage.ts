import type { Link, List, ListItem, Paragraph, PhrasingContent, RootContent, Table, TableCell, Text } from 'mdast';
import { readAttributes, type Element } from './attributes';
import { forbiddenCharacter, forbiddenSentence } from './characters';
import { componentOf, COMPONENTS, type Attributes } from './components';
import { linkFault, plainAddress } from './links';
import { nearest } from './nearest';
import { gathered } from './arrange';
import { tidyInside, tidyWords } from './phrasing';
import { problem, type Place } from './problems';
import { refusal } from './refusals';
import type { Frontmatter } from './schema';
import type { SourceProblem } from './types';

/** What the check of a passage carries along: where to report, and what keys may point at. */
export interface Checking {
  /** null while the front matter itself is wrong: keys are then not looked up. */
  head: Frontmatter | null;
  problems: SourceProblem[];
  /** Place in the form: `intro` or `steps.3.body`. */
  path: string;
}

export function report(c: Checking, place: Place | undefined, message: string): null {
  c.problems.push(problem(place, message, c.path));
  return null;
}

const keepPlace = (node: { position?: RootContent['position'] }) => (node.position ? { position: node.position } : {});

/** A component of the closed set with literal attributes in their fixed order, or null with a report. */
export function cleanElement(element: Element, c: Checking): { name: string; given: Attributes } | null {
  const start = element.position?.start;
  const component = componentOf(element.name);
  if (!component || element.name === null) {
    const name = element.name ?? '';
    const near = nearest(name, Object.keys(COMPONENTS));
    if (!near && /^[a-z]/.test(name))
      return report(
        c,
        start,
        `HTML is not used. Remove <${name.slice(0, 40)}> and write plain text with the components of the sheet.`,
      );
    const help = near ? `Did you mean ${near}?` : `There is ${Object.keys(COMPONENTS).join(', ')}.`;
    return report(c, start, `There is no component "${name.slice(0, 40)}". ${help}`);
  }
  const { given, placeOf, problems } = readAttributes(element, component);
  for (const p of problems) report(c, p, p.message);
  if (problems.length) return null;
  if (component.holds === 'nothing' && element.children.length > 0)
    return report(c, start, `${element.name} holds no words of its own. Write ${component.example}.`);
  if (c.head) for (const fault of component.faults(given, c.head)) report(c, placeOf(fault.attribute), fault.message);
  const ordered = Object.keys(component.attributes).flatMap((n) => (given[n] === undefined ? [] : [[n, given[n]]]));
  return { name: element.name, given: Object.fromEntries(ordered) as Attributes };
}

export function elementNode<T extends Element['type']>(type: T, name: string, given: Attributes, from: Element) {
  const attributes = Object.entries(given).map(([n, value]) => ({ type: 'mdxJsxAttribute' as const, name: n, value }));
  return { type, name, attributes, children: [], ...keepPlace(from) };
}

function checkedText(node: Text, c: Checking): PhrasingContent[] {
  const found = forbiddenCharacter(node.value.replace(/\n/g, ' '));
  if (found) report(c, node.position?.start, forbiddenSentence(found.what));
  return [{ type: 'text', value: node.value, ...keepPlace(node) }];
}

function checkedLink(node: Link, c: Checking, inside: readonly string[]): PhrasingContent[] {
  const start = node.position?.start;
  const plain = plainAddress(node);
  if (plain !== null) return checkedText({ type: 'text', value: plain, ...keepPlace(node) }, c);
  const fault = linkFault(node.url);
  if (fault) report(c, start, fault);
  if (node.title)
    report(c, start, 'A link carries no title of its own. Remove the words in quotes behind the address.');
  const children = tidyWords(words(node.children, c, [...inside, 'link'])) as Link['children'];
  if (children.length === 0)
    report(c, start, 'This link has no words to press on. Write them between the square brackets.');
  return [{ type: 'link', url: node.url, children, ...keepPlace(node) }];
}

function misplaced(element: Element, c: Checking): void {
  if (!componentOf(element.name)) cleanElement(element, c);
  else
    report(
      c,
      element.position?.start,
      `${element.name} stands on its own: put it on a line by itself, with a blank line before and after, and not inside a list, a quotation or a table.`,
    );
}

function sentenceElement(element: Element, c: Checking): PhrasingContent[] {
  const component = componentOf(element.name);
  if (component && component.stands !== 'sentence') {
    misplaced(element, c);
    return [];
  }
  const clean = cleanElement(element, c);
  return clean ? [elementNode('mdxJsxTextElement', clean.name, clean.given, element)] : [];
}

/** The words of a paragraph or cell, checked and cleaned, not yet trimmed. */
export function words(
  nodes: readonly PhrasingContent[],
  c: Checking,
  inside: readonly string[] = [],
): PhrasingContent[] {
  return nodes.flatMap((node): PhrasingContent[] => {
    switch (node.type) {
      case 'text':
        return checkedText(node, c);
      case 'break':
        return [{ type: 'break' }];
      case 'inlineCode': {
        const found = forbiddenCharacter(node.value.replace(/\n/g, ' '));
        if (found) report(c, node.position?.start, forbiddenSentence(found.what));
        return [{ type: 'inlineCode', value: node.value.replace(/\n/g, ' '), ...keepPlace(node) }];
      }
      case 'emphasis':
      case 'strong': {
        const children = words(node.children, c, [...inside, node.type]);
        // Emphasis within emphasis says nothing more and could not be written back as it was.
        return inside.includes(node.type) ? children : [{ type: node.type, children: tidyInside(children) }];
      }
      case 'link':
        return checkedLink(node, c, inside);
      case 'mdxJsxTextElement':
        return sentenceElement(node, c);
      default:
        report(c, node.position?.start, refusal(node.type));
        return [];
    }
  });
}

function list(node: List, c: Checking): RootContent[] {
  const items = node.children.map((item): ListItem => {
    if (item.checked !== null && item.checked !== undefined)
      report(c, item.position?.start, 'Boxes to tick are not used: every step is signed. Remove the square brackets.');
    return {
      type: 'listItem',
      spread: item.spread === true,
      children: passage(item.children, c) as ListItem['children'],
      ...keepPlace(item),
    };
  });
  const loose = (node.spread === true && items.length > 1) || items.some((i) => i.spread && i.children.length > 1);
  for (const item of items) item.spread = loose;
  const start = node.ordered ? { start: node.start ?? 1 } : {};
  return [
    { type: 'list', ordered: node.ordered === true, ...start, spread: loose, children: items, ...keepPlace(node) },
  ];
}

function table(node: Table, c: Checking): RootContent[] {
  const columns = node.children[0]?.children.length ?? 0;
  const rows = node.children.map((row) => {
    if (row.children.length > columns)
      report(
        c,
        row.children[columns]?.position?.start,
        `This row has ${row.children.length} cells, the first row ${columns}. Give every row as many.`,
      );
    const cells = row.children.map((cell): TableCell => ({
      type: 'tableCell',
      children: tidyWords(words(cell.children, c)),
      ...keepPlace(cell),
    }));
    while (cells.length < columns) cells.push({ type: 'tableCell', children: [] });
    return { type: 'tableRow' as const, children: cells };
  });
  const align = Array.from({ length: columns }, (_, i) => node.align?.[i] ?? null);
  return [{ type: 'table', align, children: rows, ...keepPlace(node) }];
}

export function paragraph(node: Paragraph, c: Checking): Paragraph[] {
  const children = tidyWords(words(node.children, c));
  return children.length ? [{ type: 'paragraph', children, ...keepPlace(node) }] : [];
}

/** Paragraphs, lists, quotations and tables, checked and cleaned; anything else is reported and left out. */
export function passage(nodes: readonly RootContent[], c: Checking): RootContent[] {
  return gathered(nodes, c).flatMap((node): RootContent[] => {
    switch (node.type) {
      case 'paragraph':
        return paragraph(node, c);
      case 'list':
        return list(node, c);
      case 'blockquote': {
        const children = passage(node.children, c);
        return children.length
          ? [{ type: 'blockquote', children: children as typeof node.children, ...keepPlace(node) }]
          : [];
      }
      case 'table':
        return table(node, c);
      case 'mdxJsxFlowElement':
        // Only what stands on its own is left here by `gathered`; it has no place in a list or a quotation.
        misplaced(node, c);
        return [];
      default:
        report(c, node.position?.start, refusal(node.type));
        return [];
    }
  });
}
