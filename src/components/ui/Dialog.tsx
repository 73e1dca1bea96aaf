import { useEffect, useId, useRef, type ReactNode } from 'react';
import { classes } from './classes';

/**
 * A question that must be answered before going on, in the browser's own dialog: focus stays inside, Escape
 * closes, focus returns to what opened it.
 */
export function Dialog({
  open,
  title,
  onClose,
  actions,
  wide = false,
  children,
}: {
  open: boolean;
  title: string;
  onClose: () => void;
  /** Buttons, the main one first. */
  actions: ReactNode;
  /** For a picture: as wide as the window allows. */
  wide?: boolean;
  children: ReactNode;
}) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const element = dialog.current;
    if (open && !element?.open) element?.showModal();
    if (!open && element?.open) element.close();
  }, [open]);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onClose={onClose}
      className={classes(
        'frame m-auto overflow-auto p-0 text-ink backdrop:bg-pit/60',
        wide ? 'max-h-[96vh] w-fit max-w-[calc(100vw-1rem)]' : 'max-h-[90vh] w-[min(36rem,calc(100vw-2rem))]',
      )}
    >
      <div className="framed-sections">
        <h2 id={titleId} className="px-6 py-4 text-lead">
          {title}
        </h2>
        <div className="flex flex-col gap-4 px-6 py-5">{children}</div>
        <div className="flex flex-wrap gap-2.5 px-6 py-4">{actions}</div>
      </div>
    </dialog>
  );
}
