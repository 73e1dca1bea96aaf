import { NodeSelection } from 'prosemirror-state';
import { useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { VisuallyHidden } from '@/components/ui/VisuallyHidden';
import { classes } from '@/components/ui/classes';
import { documentOf } from '@/domain/writing/field/fromTree';
import { readWords } from '@/domain/writing/field/readWords';
import { SCHEMAS, type Where } from '@/domain/writing/field/schema';
import type { SourceProblem } from '@/domain/procedure/types';
import { useDesk } from '../desk';
import type { FieldHandle, LayoutHandle } from '../fieldHandle';
import { ChipPanel } from './ChipPanel';
import { FieldView } from './fieldView';
import { LinkPanel } from './LinkPanel';
import { hrefAt, linked } from './links';

interface Props {
  where: Where;
  value: string;
  /** What the form holds at this moment, which may be newer than `value`. */
  latest: () => string;
  set: (text: string) => void;
  onBlur: () => void;
  onHandle: (handle: (FieldHandle & LayoutHandle) | null) => void;
  onUnreadable: (problem: SourceProblem) => void;
  /** Attributes of the box that the words stand in. */
  attributes: Record<string, string>;
  focus: boolean;
}

type Open = { kind: 'chip'; at: number } | { kind: 'link' };

const MOD = typeof navigator !== 'undefined' && /Mac|iP(hone|ad)/.test(navigator.platform) ? '⌘' : 'Ctrl ';

/** The words of a step or of the introduction with their values as chips among them. */
export default function FieldEditor(props: Props) {
  const { where, value, attributes } = props;
  const { draft } = useDesk();
  const place = useRef<HTMLDivElement>(null);
  const now = useRef({ ...props, draft });
  const field = useRef<FieldView | null>(null);
  const [shown, setShown] = useState<FieldView | null>(null);
  const [open, setOpen] = useState<(Open & { left: number; top: number }) | null>(null);
  const [left, setLeft] = useState<string[]>([]);
  const [selected, setSelected] = useState('');
  useLayoutEffect(() => {
    now.current = { ...props, draft };
  });

  useLayoutEffect(() => {
    const box = place.current;
    if (!box) return;
    const text = now.current.latest();
    const read = readWords(text, where);
    if (!read.ok) {
      now.current.onUnreadable(read.problem);
      return;
    }
    /** Under what is selected, and inside of the field. */
    const under = (made: FieldView) => {
      const frame = box.getBoundingClientRect();
      const { selection } = made.view.state;
      const start = made.view.coordsAtPos(selection.from, 1);
      const end = made.view.coordsAtPos(selection.to, -1);
      const left = Math.max(0, Math.min(start.left - frame.left, frame.width - Math.min(384, frame.width)));
      return { left, top: end.bottom - frame.top + 6 };
    };
    const made: FieldView = new FieldView(box, where, documentOf(read.nodes, SCHEMAS[where]), text, now.current.draft, {
      text: (next) => now.current.set(next),
      open: (at) => setOpen({ kind: 'chip', at, ...under(made) }),
      link: () => setOpen({ kind: 'link', ...under(made) }),
      leftOut: setLeft,
      selected: setSelected,
      blur: () => now.current.onBlur(),
      unreadable: (problem) => now.current.onUnreadable(problem),
    });
    field.current = made;
    setShown(made);
    now.current.onHandle({
      put: (piece) => made.put(piece),
      formats: () => made.formats(MOD),
      run: ({ run }) => made.run(run),
    });
    if (now.current.focus) made.view.focus();
    // A label is only for the controls that the browser itself brings.
    const label = document.getElementById(now.current.attributes['aria-labelledby'] ?? '');
    const toWords = () => made.view.focus();
    label?.addEventListener('click', toWords);
    return () => {
      label?.removeEventListener('click', toWords);
      now.current.onHandle(null);
      field.current = null;
      made.destroy();
    };
    // The view is made once; what changes reaches it below.
  }, [where]);

  const told = JSON.stringify(attributes);
  useLayoutEffect(() => {
    shown?.view.setProps({ attributes: JSON.parse(told) as Record<string, string> });
  }, [shown, told]);
  useLayoutEffect(() => {
    shown?.take(now.current.latest());
  }, [shown, value]);
  useEffect(() => {
    shown?.follow(draft);
  }, [shown, draft]);

  const close = useCallback(
    (back: boolean) => {
      setOpen(null);
      if (back) shown?.view.focus();
    },
    [shown],
  );
  const selection = shown?.view.state.selection;
  const node = open?.kind === 'chip' && shown ? shown.view.state.doc.nodeAt(open.at) : null;
  return (
    <>
      <div className={classes('relative', open && 'z-20')}>
        <div ref={place} className="field-words" />
        {shown && open?.kind === 'chip' && node && selection instanceof NodeSelection && (
          <ChipPanel
            key={open.at}
            node={node}
            words={shown.wordsOf(node)}
            at={{ left: open.left, top: open.top }}
            onClose={close}
            onExchange={(piece) => {
              setOpen(null);
              shown.exchange(open.at, piece);
            }}
            onRemove={() => {
              setOpen(null);
              shown.remove(open.at);
            }}
            onBeside={(side) => {
              setOpen(null);
              shown.writeBeside(open.at, side);
            }}
          />
        )}
        {shown && open?.kind === 'link' && (
          <LinkPanel
            first={hrefAt(shown.view.state)}
            at={{ left: open.left, top: open.top }}
            onClose={close}
            onLink={(href) => {
              setOpen(null);
              shown.view.focus();
              shown.view.dispatch(linked(shown.view.state, href));
            }}
          />
        )}
      </div>
      <div role="status">
        {left.map((sentence) => (
          <p key={sentence} className="border-l-[8px] border-rule pl-2.5 leading-snug">
            {sentence}
          </p>
        ))}
      </div>
      <VisuallyHidden>
        <span role="status">{selected && `${selected}. Enter shows what can be done with it.`}</span>
      </VisuallyHidden>
    </>
  );
}
