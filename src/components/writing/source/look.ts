import { HighlightStyle, syntaxHighlighting } from '@codemirror/language';
import {
  Decoration,
  EditorView,
  MatchDecorator,
  ViewPlugin,
  type DecorationSet,
  type ViewUpdate,
} from '@codemirror/view';
import { tags } from '@lezer/highlight';

// Colours and sizes stand in writing.css, where the tokens are; here each kind of word gets its class.
const classes = HighlightStyle.define([
  { tag: [tags.propertyName, tags.definition(tags.propertyName)], class: 'source-field' },
  { tag: [tags.number, tags.bool], class: 'source-number' },
  { tag: [tags.meta, tags.separator, tags.punctuation, tags.processingInstruction], class: 'source-quiet' },
  { tag: tags.comment, class: 'source-quiet' },
  { tag: tags.strong, class: 'source-strong' },
  { tag: tags.emphasis, class: 'source-emphasis' },
  { tag: [tags.link, tags.url], class: 'source-link' },
  { tag: tags.monospace, class: 'source-code' },
]);

const component = new MatchDecorator({
  regexp: /<\/?[A-Z][A-Za-z]*(?:\s[^<>\n]*)?>/g,
  decoration: Decoration.mark({ class: 'source-tag' }),
});

/** Components of the sheet on a wash, as in the form. */
const components = ViewPlugin.fromClass(
  class {
    shown: DecorationSet;
    constructor(view: EditorView) {
      this.shown = component.createDeco(view);
    }
    update(update: ViewUpdate) {
      this.shown = component.updateDeco(update, this.shown);
    }
  },
  { decorations: (plugin) => plugin.shown },
);

export const look = [syntaxHighlighting(classes), components];
