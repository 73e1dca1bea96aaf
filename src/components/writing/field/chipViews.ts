import { DOMSerializer, type Fragment, type Node, type Schema } from 'prosemirror-model';
import type { NodeView, NodeViewConstructor } from 'prosemirror-view';
import { chipLine, chipWords, type ChipWords } from '@/domain/writing/chipWords';
import type { Draft } from '@/domain/writing/draft';
import { BLOCK_CHIPS, givenOf, SENTENCE_CHIPS } from '@/domain/writing/field/schema';

/** A word ahead of what stands on its own, so that it is told from a sentence. */
export const BLOCK_WORDS: Record<string, string> = { Figure: 'Drawing', Worksheet: 'Worksheet' };

export const wordsIn = (words: ChipWords, node: Node): string =>
  [BLOCK_WORDS[node.type.name], chipLine(words)].filter(Boolean).join(': ');

class ChipView implements NodeView {
  readonly dom: HTMLElement;
  constructor(
    private node: Node,
    private readonly chips: Chips,
  ) {
    this.dom = document.createElement(node.isInline ? 'span' : 'div');
    this.say();
  }

  say(): void {
    const words = this.chips.wordsOf(this.node);
    const text = wordsIn(words, this.node);
    if (this.dom.textContent !== text) this.dom.textContent = text;
    const name = `chip${this.node.isInline ? '' : ' chip-block'}${words.missing === null ? '' : ' chip-lost'}`;
    // The view sets a class of its own on what is selected.
    const selected = this.dom.classList.contains('ProseMirror-selectednode') ? ' ProseMirror-selectednode' : '';
    if (this.dom.className !== name + selected) this.dom.className = name + selected;
  }

  update(node: Node): boolean {
    if (node.type !== this.node.type) return false;
    this.node = node;
    this.say();
    return true;
  }

  ignoreMutation = () => true;
  destroy = () => this.chips.gone(this);
}

/** The chips of one field: what each says follows the draft. */
export class Chips {
  private readonly shown = new Set<ChipView>();
  constructor(private draft: Draft) {}

  wordsOf = (node: Node): ChipWords => chipWords(node.type.name, givenOf(node), this.draft);

  /** Says everything anew by the values of `draft`. */
  follow(draft: Draft): void {
    this.draft = draft;
    for (const view of this.shown) view.say();
  }

  gone = (view: ChipView) => this.shown.delete(view);

  private readonly view: NodeViewConstructor = (node) => {
    const view = new ChipView(node, this);
    this.shown.add(view);
    return view;
  };

  get nodeViews(): Record<string, NodeViewConstructor> {
    return Object.fromEntries([...SENTENCE_CHIPS, ...BLOCK_CHIPS].map((name) => [name, this.view]));
  }

  /** How chips are copied: with their words, for whatever they are pasted into. */
  serializer(schema: Schema): DOMSerializer {
    const nodes = DOMSerializer.nodesFromSchema(schema);
    for (const name of [...SENTENCE_CHIPS, ...BLOCK_CHIPS]) {
      const bare = nodes[name];
      if (bare)
        nodes[name] = (node) => {
          const [tag, attributes] = bare(node) as unknown as [string, Record<string, string>];
          return [tag, attributes, wordsIn(this.wordsOf(node), node)];
        };
    }
    return new OwnSerializer(nodes, DOMSerializer.marksFromSchema(schema));
  }
}

/** Says in the copied HTML that it comes from a field, so that it is taken back as it is. */
export const OWN = 'data-field-words';

class OwnSerializer extends DOMSerializer {
  override serializeFragment(
    fragment: Fragment,
    options?: { document?: Document },
    target?: HTMLElement | DocumentFragment,
  ): HTMLElement | DocumentFragment {
    const made = super.serializeFragment(fragment, options, target);
    made.firstElementChild?.setAttribute(OWN, '');
    return made;
  }
}
