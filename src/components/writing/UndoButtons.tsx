import { Button } from '@/components/ui/Button';
import type { DeskUndo } from './useUndoing';

const WORDS = { undo: 'Undo', redo: 'Redo' } as const;

/** One step back and one forward, each saying what it would change. They keep the focus when there is nothing left. */
export const UndoButtons = ({ undoing }: { undoing: DeskUndo }) => (
  <div className="writing-undo" hidden={!undoing.active}>
    {(['undo', 'redo'] as const).map((way) => {
      const said = undoing[way];
      const words = said === null ? WORDS[way] : `${WORDS[way]}: ${said}`;
      return (
        <Button
          key={way}
          kind="quiet"
          title={said === null ? undefined : words}
          aria-disabled={said === null}
          onClick={() => said !== null && undoing.step(way)}
        >
          <span className="truncate">{words}</span>
        </Button>
      );
    })}
    <p className="sr-only" role="status">
      {undoing.said}
    </p>
  </div>
);
