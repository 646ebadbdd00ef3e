import { useEffect, useRef } from 'react';
import { Button } from './Button.tsx';
import { Notice } from './Notice.tsx';
import { type Tone } from './ToneGlyph.tsx';

export type Toast = {
  readonly id: string;
  readonly tone: Tone;
  readonly text: string;
  readonly action?: { readonly label: string; readonly onSelect: () => void } | undefined;
};

type ToastsProps = { readonly toasts: readonly Toast[]; readonly onDismiss: (id: string) => void };

const STAYS_MS = 8000;

/** What just happened, at the foot of the page. Only good news without a choice in it leaves by itself. */
export function Toasts({ toasts, onDismiss }: ToastsProps) {
  return (
    <div
      role="status"
      aria-label="What just happened"
      className="pointer-events-none fixed inset-x-4 bottom-4 z-20 grid justify-items-center gap-2"
    >
      {toasts.map((toast) => (
        <ToastLine key={toast.id} toast={toast} onDismiss={onDismiss} />
      ))}
    </div>
  );
}

type ToastLineProps = { readonly toast: Toast; readonly onDismiss: (id: string) => void };

function ToastLine({ toast, onDismiss }: ToastLineProps) {
  const { id, tone, text, action } = toast;
  const line = useRef<HTMLDivElement>(null);
  const leaves = tone === 'done' && action === undefined;

  useEffect(() => {
    if (!leaves) return undefined;
    const timer = setInterval(() => {
      // Whoever is reading it with the pointer or the keyboard on it keeps it.
      if (line.current?.matches(':hover, :focus-within') !== true) onDismiss(id);
    }, STAYS_MS);
    return () => {
      clearInterval(timer);
    };
  }, [leaves, id, onDismiss]);

  return (
    <div ref={line} className="pointer-events-auto w-full max-w-xl">
      <Notice
        tone={tone}
        action={
          <>
            {action !== undefined && (
              <Button size="small" onClick={action.onSelect}>
                {action.label}
              </Button>
            )}
            <Button
              size="small"
              variant="quiet"
              onClick={() => {
                onDismiss(id);
              }}
            >
              Close
            </Button>
          </>
        }
      >
        {text}
      </Notice>
    </div>
  );
}
