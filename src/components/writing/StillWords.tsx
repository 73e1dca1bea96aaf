import { chipLine, chipWords } from '@/domain/writing/chipWords';
import { useDesk } from './desk';

const TAG = /(<[A-Z][A-Za-z]*(?:\s[^<>]*)?\/>)/;
const ATTRIBUTE = /([a-z]+)="([^"]*)"/g;

/** The words until they can be written in: their values as chips, all other signs as they are stored. */
export function StillWords({ id, value, least }: { id: string; value: string; least: string }) {
  const { draft } = useDesk();
  const chip = (tag: string) => {
    const name = /^<([A-Za-z]+)/.exec(tag)?.[1] ?? '';
    return chipLine(chipWords(name, Object.fromEntries([...tag.matchAll(ATTRIBUTE)].map(([, n, v]) => [n, v])), draft));
  };
  return (
    <div id={id} tabIndex={-1} aria-busy="true" className="field-still" style={{ minHeight: least }}>
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
