import type { Node } from 'prosemirror-model';
import { givenOf } from '@/domain/writing/field/schema';
import { componentText } from '@/domain/writing/componentText';
import type { ChipWords } from '@/domain/writing/chipWords';
import type { Piece } from '@/domain/writing/insert';
import { choicesFor } from '../choices';
import { useDesk } from '../desk';
import { MenuItem } from '../Menu';
import { fieldId, LIST_NAMES, ONE_OF } from '../places';
import { WorksheetChoices } from '../WorksheetChoices';
import { wordsIn } from './chipViews';
import { Panel } from './Panel';

/** What can be done with the chip that is selected: to its value, another in its place, away with it. */
export function ChipPanel({
  node,
  words,
  at,
  onClose,
  onExchange,
  onRemove,
  onBeside,
}: {
  node: Node;
  words: ChipWords;
  at: { left: number; top: number };
  onClose: (back: boolean) => void;
  onExchange: (piece: Piece) => void;
  onRemove: () => void;
  onBeside: (side: 'above' | 'below') => void;
}) {
  const { draft, choose, focusSoon } = useDesk();
  const { target } = words;
  const own = componentText(node.type.name, givenOf(node));
  const offered = choicesFor(node.type.name);
  const others = offered?.choices(draft).filter(({ piece }) => piece.text !== own) ?? [];
  const goTo = () => {
    if (!target) return;
    const path = `${target.list}.${target.index}.${target.field}`;
    onClose(false);
    // The values of a step stand under its words; then nothing else needs to come on the screen.
    const box = [fieldId(path), `${fieldId(path)}-${Number(givenOf(node)['pass'] ?? 1) - 1}`];
    const here = box.find((id) => document.getElementById(id));
    if (!here) choose({ list: target.list });
    focusSoon(here ?? fieldId(path));
  };
  return (
    <Panel label={wordsIn(words, node)} at={at} onClose={onClose}>
      {words.missing !== null && (
        <p className="border-l-[8px] border-ink px-3 pb-1.5 font-medium leading-snug">
          {words.missing}. Choose another, or take it out.
        </p>
      )}
      {target && (
        <MenuItem detail={LIST_NAMES[target.list]} onChoose={goTo}>
          Go to its value
        </MenuItem>
      )}
      {node.isBlock && (
        <>
          <MenuItem onChoose={() => onBeside('above')}>Write above it</MenuItem>
          <MenuItem onChoose={() => onBeside('below')}>Write below it</MenuItem>
        </>
      )}
      <MenuItem onChoose={onRemove}>Take it out</MenuItem>
      {node.type.name === 'Worksheet' ? (
        <WorksheetChoices first={(givenOf(node)['of'] ?? '').split(' ')} onChoose={onExchange} />
      ) : (
        others.length > 0 && (
          <>
            <p className="mt-1.5 border-t border-hair px-3.5 pt-2 text-small text-ink-2">
              Another {offered ? (offered.list === 'figures' ? 'drawing' : ONE_OF[offered.list]) : ''} in its place
            </p>
            {others.map((choice) => (
              <MenuItem key={choice.key} detail={choice.detail} onChoose={() => onExchange(choice.piece)}>
                {choice.name}
              </MenuItem>
            ))}
          </>
        )
      )}
    </Panel>
  );
}
