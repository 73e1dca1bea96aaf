import type { LeftOut } from '../../api/schemas/imports';
import { tidy } from './nodes';

/**
 * Reads the bare words of a part of a .docx (ECMA-376, part 1, WordprocessingML) beside the conversion, and what the
 * conversion passes over: words under tracked changes, formulas, text boxes. One pass, no tree, nothing evaluated.
 */
export interface Scanned {
  /** Every word that the part shows or keeps, deleted ones too; a line for each paragraph. */
  words: string;
  leftOut: LeftOut[];
}

const TOKEN = /<!--[\s\S]*?-->|<!\[CDATA\[([\s\S]*?)\]\]>|<\?[\s\S]*?\?>|<(\/?)([\w:.-]+)([^>]*?)(\/?)>|([^<]+)/g;
const ENTITIES: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };
const decoded = (text: string) =>
  text.replace(
    /&(?:#x([\da-f]{1,6})|#(\d{1,7})|(\w{2,4}));/gi,
    (whole, hex?: string, number?: string, name?: string) => {
      const code = hex ? Number.parseInt(hex, 16) : number ? Number(number) : null;
      if (code !== null) return code > 0 && code <= 0x10ffff ? String.fromCodePoint(code) : ' ';
      return ENTITIES[name?.toLowerCase() ?? ''] ?? whole;
    },
  );

/** Elements whose words are told, by what they are called there; `null` where they come over as they are. */
const WATCHED: Record<string, { what: string; became: string | null }> = {
  'w:del': { what: 'Tracked change: words taken out', became: null },
  'w:moveFrom': { what: 'Tracked change: words taken out', became: null },
  'w:ins': { what: 'Tracked change: words put in', became: 'words like all others' },
  'm:oMath': { what: 'Formula', became: null },
  'w:txbxContent': { what: 'Text box', became: 'words where it was anchored' },
};
const HOLDS_WORDS = new Set(['w:t', 'w:delText', 'm:t', 'a:t', 'c:v']);

/** Parts that never come into the text, by what they are called there. */
const APART = {
  header: { what: 'Head of the pages', where: 'every page' },
  footer: { what: 'Foot of the pages', where: 'every page' },
  diagram: { what: 'Diagram', where: 'the document' },
  chart: { what: 'Chart', where: 'the document' },
} as const;
export type PartOfDocument = 'body' | 'note' | keyof typeof APART;

/** Reads one part. */
export function scanPart(xml: string, place: PartOfDocument): Scanned {
  const leftOut: LeftOut[] = [];
  let words = '';
  let paragraph = '';
  let before = '';
  let aside = '';
  let reading = false;
  let raised = false;
  /** Open watched elements, innermost last, with the words in them. */
  const open: { name: string; text: string }[] = [];
  /** The words ahead of each open choice between two ways to draw the same thing, of which one counts. */
  const choices: { words: string; paragraph: string; told: number }[] = [];
  let waiting: LeftOut[] = [];
  const add = (text: string) => {
    for (const one of open) one.text += text;
    // Words that are not read on with the others stand behind the paragraph, so that no two of them run together.
    if (open.some((one) => WATCHED[one.name]?.became === null)) return;
    words += text;
    paragraph += text;
  };
  const endParagraph = () => {
    const own = tidy(paragraph);
    for (const item of waiting) {
      const near = own || before;
      item.where = near ? `near “${near.slice(0, 80)}”` : 'the document';
      leftOut.push(item);
    }
    waiting = [];
    if (own) before = own;
    paragraph = '';
    words += `${aside}\n`;
    aside = '';
    for (const one of open) one.text += ' ';
  };
  for (const [, cdata, close, name, attributes = '', alone, text] of xml.matchAll(TOKEN)) {
    if (name === undefined) {
      const read = cdata ?? (text === undefined ? '' : decoded(text));
      if (reading && read) add(raised ? ` ${read} ` : read);
      continue;
    }
    const isEnd = close === '/';
    if (HOLDS_WORDS.has(name)) reading = !isEnd && alone !== '/';
    else if (name === 'w:vertAlign') raised = /"(super|sub)script"/.test(attributes);
    else if (name === 'w:r' && isEnd) raised = false;
    else if (['w:tab', 'w:br', 'w:cr', 'w:ptab', 'a:p', 'a:br', 'c:pt'].includes(name)) add(' ');
    else if (name === 'w:noBreakHyphen') add('-');
    else if (name === 'w:p' && isEnd) endParagraph();
    else if (name === 'mc:AlternateContent' && !alone) {
      if (isEnd) choices.pop();
      else choices.push({ words, paragraph, told: waiting.length });
    } else if (name === 'mc:Fallback' && !isEnd && !alone) {
      // What was read since is the other way to draw the same thing; the conversion takes this one.
      const choice = choices.at(-1);
      if (choice) {
        words = choice.words;
        paragraph = choice.paragraph;
        waiting.length = Math.min(waiting.length, choice.told);
      }
    } else if (WATCHED[name] && !alone) {
      if (!isEnd) open.push({ name, text: '' });
      else {
        const at = open.map((one) => one.name).lastIndexOf(name);
        const [one] = at < 0 ? [] : open.splice(at, 1);
        if (!one || !tidy(one.text)) continue;
        const told = WATCHED[name];
        waiting.push({ ...told, where: '', quote: tidy(one.text) });
        if (told.became === null) aside += `\n${one.text}`;
      }
    }
  }
  endParagraph();
  if (place === 'body' || place === 'note') return { words, leftOut };
  const quote = tidy(words);
  return { words, leftOut: quote ? [{ ...APART[place], quote, became: null }] : [] };
}
