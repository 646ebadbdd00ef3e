import { type ReactNode, useEffect, useId, useRef } from 'react';

type DialogProps = {
  readonly open: boolean;
  /** Asked to close: by Escape, by the close button. The owner sets `open`. */
  readonly onClose: () => void;
  readonly title: string;
  /** The buttons at its foot, the one that does it first. */
  readonly actions?: ReactNode;
  readonly children?: ReactNode;
};

/** A sheet laid over the page. The browser keeps focus in it and gives it back afterwards. */
export function Dialog({ open, onClose, title, actions, children }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();

  useEffect(() => {
    const element = dialog.current;
    if (element === null || element.open === open) return;
    if (open) element.showModal();
    else element.close();
  }, [open]);

  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClose={() => {
        if (open) onClose();
      }}
      className="max-h-[90dvh] w-[min(36rem,calc(100vw-2rem))] border border-ink bg-sheet text-ink backdrop:bg-pocket/60"
    >
      <div className="flex items-start justify-between gap-4 border-b border-ink px-4 py-3">
        <h2 id={titleId} className="text-lg">
          {title}
        </h2>
        <button type="button" onClick={onClose} className="-m-1 p-1 text-ink-soft hover:text-ink">
          <svg width="24" height="24" aria-hidden="true" stroke="currentColor" strokeWidth="1.5">
            <path d="M6 6l12 12M18 6L6 18" />
          </svg>
          <span className="sr-only">Close</span>
        </button>
      </div>
      <div className="px-4 py-4">{children}</div>
      {actions != null && (
        <div className="flex flex-wrap gap-2 border-t border-line px-4 py-3">{actions}</div>
      )}
    </dialog>
  );
}
