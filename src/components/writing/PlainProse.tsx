import { useLayoutEffect, useRef } from 'react';
import { tie, type FieldWords } from '@/components/ui/FieldShell';
import { insertAt, inserted, type Piece } from '@/domain/writing/insert';
import type { FieldHandle } from './fieldHandle';

const TAG = /(<\/?[A-Z][A-Za-z]*(?:\s[^<>]*)?>)/;

/** Puts a component where the caret of a text area stands, so that the browser's own undo takes it out again. */
function insertInto(area: HTMLTextAreaElement, piece: Piece): void {
  const caret = { text: area.value, start: area.selectionStart, end: area.selectionEnd };
  const insertion = insertAt(caret, piece);
  area.focus();
  // The old way of editing is the only one that joins the undo history; where it is gone, the value is set.
  if (!document.execCommand('insertText', false, insertion.replacement)) {
    const set = Object.getOwnPropertyDescriptor(HTMLTextAreaElement.prototype, 'value')?.set;
    set?.call(area, inserted(caret, insertion));
    area.dispatchEvent(new Event('input', { bubbles: true }));
  }
  area.setSelectionRange(insertion.start, insertion.end);
}

/**
 * The words as they are stored, for those that cannot be shown otherwise. A copy of the text lies under the area with its
 * components on a wash, which also gives the area its height.
 */
export function PlainProse({
  words,
  value,
  set,
  onBlur,
  onHandle,
  least,
}: {
  words: FieldWords;
  value: string;
  set: (text: string) => void;
  onBlur: () => void;
  onHandle: (handle: FieldHandle | null) => void;
  least: string;
}) {
  const area = useRef<HTMLTextAreaElement>(null);
  useLayoutEffect(() => {
    // A scroll bar of the area would break its lines elsewhere than the copy does.
    if (area.current) area.current.scrollTop = 0;
  }, [value]);
  useLayoutEffect(() => {
    onHandle({
      put: (piece) => {
        if (area.current) insertInto(area.current, piece);
      },
    });
    return () => onHandle(null);
  }, [onHandle]);
  return (
    <div className="prose-edit" style={{ minHeight: least }}>
      <div aria-hidden="true" className="prose-edit-copy">
        {value.split(TAG).map((piece, i) =>
          i % 2 === 1 ? (
            <mark key={i} className={/^<\/?(Hold|Figure|Worksheet)\b/.test(piece) ? 'tag tag-block' : 'tag'}>
              {piece}
            </mark>
          ) : (
            piece
          ),
        )}
        {/* A line end at the very end takes a line of its own in an area, and none in a block. */}
        {'\u200b'}
      </div>
      <textarea
        {...tie(words)}
        ref={area}
        value={value}
        autoComplete="off"
        spellCheck
        className="prose-edit-area"
        onChange={(event) => set(event.target.value)}
        onBlur={onBlur}
      />
    </div>
  );
}
