import { dismiss, useNotices } from '../lib/notices.ts';

/** Notices in the corner, and the live region by which marks and moves announce themselves. */
export function Toaster() {
  const { shown, spoken } = useNotices();
  return (
    <>
      <div aria-live="polite" className="sr-only" data-testid="spoken">
        {spoken}
      </div>
      <div className="fixed right-4 bottom-4 z-50 flex w-[min(26rem,calc(100vw-2rem))] flex-col gap-2 print:hidden">
        {shown.map((notice) => (
          <div
            key={notice.id}
            role={notice.kind === 'error' ? 'alert' : 'status'}
            className={`flex items-start gap-3 border bg-sheet px-4 py-3 shadow-lg ${notice.kind === 'error' ? 'border-madder' : 'border-rule'}`}
          >
            <p className="grow">
              {notice.kind === 'error' && <span className="font-semibold text-madder">▲ </span>}
              {notice.text}
            </p>
            <button
              type="button"
              className="cursor-pointer text-pencil hover:text-ink"
              aria-label="Dismiss"
              onClick={() => dismiss(notice.id)}
            >
              ✕
            </button>
          </div>
        ))}
      </div>
    </>
  );
}
