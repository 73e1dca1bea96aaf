import { useEffect, useRef } from 'react';
import { chipLine, chipWords } from '@/domain/writing/chipWords';
import { useDesk } from './desk';

const TAG = /(<[A-Z][A-Za-z]*(?:\s[^<>]*)?\/>)/;
const ATTRIBUTE = /([a-z]+)="([^"]*)"/g;

/** The words until they can be written in: their values as chips, all other signs as they are stored. `onFocus` is told that the caret is wanted here. */
export function StillWords({
  id,
  value,
  least,
  onFocus,
}: {
  id: string;
  value: string;
  least: string;
  onFocus: () => void;
}) {
  const { draft } = useDesk();
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const place = box.current;
    place?.addEventListener('focus', onFocus);
    return () => place?.removeEventListener('focus', onFocus);
  });
  const chip = (tag: string) => {
    const name = /^<([A-Za-z]+)/.exec(tag)?.[1] ?? '';
    return chipLine(chipWords(name, Object.fromEntries([...tag.matchAll(ATTRIBUTE)].map(([, n, v]) => [n, v])), draft));
  };
  return (
    <div ref={box} id={id} tabIndex={-1} aria-busy="true" className="field-still" style={{ minHeight: least }}>
      {value
        .replace(/<\/?Hold>/g, '')
        .split(/\n{2,}/)
        .map((passage, n) => (
          <p key={n}>
            {passage.split(TAG).map((piece, i) =>
              i % 2 === 1 ? (
                <span key={i} className="chip">
                  {chip(piece)}
                </span>
              ) : (
                piece
              ),
            )}
          </p>
        ))}
    </div>
  );
}
