import { useRef, type ReactNode } from 'react';
import { useListOfActs } from '../useListOfActs';

/**
 * A small list of acts beside what is selected in the words.
 *
 * @param at where it stands under, in px from the field's own corner
 */
export function Panel({
  label,
  at,
  onClose,
  children,
}: {
  label: string;
  at: { left: number; top: number };
  onClose: (back: boolean) => void;
  children: ReactNode;
}) {
  const root = useRef<HTMLDivElement>(null);
  const keys = useListOfActs(root, true, onClose);
  return (
    // The keys are those of the acts inside; the box itself is nothing to press.
    // eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions
    <div
      ref={root}
      role="dialog"
      aria-label={label}
      tabIndex={-1}
      onKeyDown={keys}
      style={at}
      className="frame field-panel absolute z-20 max-h-80 w-[min(24rem,100%)] overflow-auto py-1.5"
    >
      {children}
    </div>
  );
}
