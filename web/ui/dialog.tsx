import { useEffect, useRef, type ReactNode } from 'react';

interface DialogProps {
  readonly title: string;
  readonly onClose: () => void;
  /** `sheet` rises from the lower edge of a small screen. */
  readonly form?: 'window' | 'sheet';
  readonly children: ReactNode;
}

const FORMS = {
  window: 'm-auto w-[min(34rem,calc(100vw-2rem))] border border-rule',
  sheet: 'mt-auto mb-0 max-h-[80dvh] w-full max-w-none border-t-2 border-copper',
} as const;

/** A modal dialog. It is open as long as it is mounted; Escape, and a press beside it, close it. */
export function Dialog({ title, onClose, form = 'window', children }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = ref.current;
    dialog?.showModal();
    // The browser would choose the first button, which is the one that closes.
    dialog?.querySelector<HTMLElement>('[data-first-focus], textarea, input:not([type=radio])')?.focus();
    return () => dialog?.close();
  }, []);
  return (
    <dialog
      ref={ref}
      aria-label={title}
      className={`bg-sheet text-left text-ink backdrop:bg-black/45 ${FORMS[form]}`}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === ref.current) onClose();
      }}
    >
      <div className="px-6 pt-5 pb-6">
        <div className="mb-3 flex items-start justify-between gap-4">
          <h2 className="font-serif text-xl font-semibold text-balance">{title}</h2>
          <button
            type="button"
            onClick={onClose}
            className="-mt-1 -mr-2 cursor-pointer px-2 py-1 text-pencil hover:text-ink"
            aria-label="Close"
          >
            ✕
          </button>
        </div>
        {children}
      </div>
    </dialog>
  );
}
