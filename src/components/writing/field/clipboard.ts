import type { ElementContent, Properties, Root, RootContent } from 'hast';
import type { Slice } from 'prosemirror-model';
import { TextSelection } from 'prosemirror-state';
import type { EditorView } from 'prosemirror-view';
import { insertPasted, takesWordsOnly } from '@/domain/writing/field/insertPasted';
import { isChip, markOf, typeOf, type Where } from '@/domain/writing/field/schema';
import { writeWords } from '@/domain/writing/field/writeWords';
import { fromHtml } from '@/domain/writing/paste/fromHtml';
import { addressIn, fromPlain } from '@/domain/writing/paste/fromPlain';
import { leftOutWords, nothingLeftOut } from '@/domain/writing/paste/leftOut';
import { OWN } from './chipViews';

const READ = ['style', 'href', 'alt', 'start', 'colspan', 'rowspan'];
/** Names that a tree writes in another way than a page. */
const NAMED: Readonly<Record<string, string>> = { colspan: 'colSpan', rowspan: 'rowSpan' };

function contentOf(node: globalThis.Node): ElementContent[] {
  return [...node.childNodes].flatMap((child): ElementContent[] => {
    if (child.nodeType === 3) return [{ type: 'text', value: child.nodeValue ?? '' }];
    if (!(child instanceof Element)) return [];
    const properties: Properties = {};
    for (const name of READ) {
      const value = child.getAttribute(name);
      if (value !== null) properties[NAMED[name] ?? name] = value;
    }
    return [{ type: 'element', tagName: child.localName.toLowerCase(), properties, children: contentOf(child) }];
  });
}

/** Pasted HTML as a bare tree. The document it is read in is dead: nothing in it is loaded or run. */
const treeOf = (html: string): Root => ({
  type: 'root',
  children: contentOf(new DOMParser().parseFromString(html, 'text/html')) as RootContent[],
});

/** Plain words of what is copied; with values in it, as a sheet is written, so that they can be pasted again. */
export function copiedText(slice: Slice, where: Where): string {
  let chips = false;
  slice.content.descendants((node) => {
    chips ||= isChip(node) || node.type.name === 'Hold';
  });
  const { schema } = slice.content.firstChild?.type ?? {};
  if (!schema) return '';
  const inline = slice.content.firstChild?.isInline;
  const content = inline ? typeOf(schema, 'paragraph').create(null, slice.content) : slice.content;
  if (chips)
    try {
      return writeWords(schema.topNodeType.createChecked(null, content), where);
    } catch {
      // Part of a list or a table, cut out of its whole.
    }
  return slice.content.textBetween(0, slice.content.size, '\n\n', '\n');
}

/** Takes over what is pasted or dropped; `told` is given what was left out of it, in sentences. */
export function bringIn(
  view: EditorView,
  data: DataTransfer,
  slice: Slice,
  where: Where,
  told: (sentences: string[]) => void,
): boolean {
  const { state } = view;
  const html = data.getData('text/html');
  const text = data.getData('text/plain');
  told([]);
  if (html && new RegExp(` ${OWN}|data-component=`).test(html)) {
    if (!takesWordsOnly(state)) return false;
    view.dispatch(insertPasted(state, slice.content));
    return true;
  }
  const address = addressIn(text);
  if (address && !state.selection.empty && state.selection instanceof TextSelection) {
    const { from, to } = state.selection;
    view.dispatch(state.tr.addMark(from, to, markOf(state.schema, 'link').create({ href: address })));
    return true;
  }
  const left = nothingLeftOut();
  let content = text ? fromPlain(text, state.schema, where, left) : null;
  // Text with components says more than the page that it was copied from.
  if (html && !/<[A-Z][A-Za-z]+[\s/>]/.test(text)) {
    const read = fromHtml(treeOf(html), state.schema);
    if (read.content.childCount > 0 || !content) content = read.content;
    Object.assign(left, read.left);
  }
  if (left.pictures.length === 0)
    for (const file of data.files) if (file.type.startsWith('image/')) left.pictures.push(html ? '' : file.name);
  told(leftOutWords(left));
  if (content && content.childCount > 0) view.dispatch(insertPasted(state, content));
  // A file is not put into words by the browser either.
  return true;
}
