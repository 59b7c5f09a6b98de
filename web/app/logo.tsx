/** The product's sign: the two shapes of one standing wave. */
export function Logo() {
  return (
    <svg viewBox="0 0 32 20" className="h-5 w-8" fill="none" strokeWidth="1.8" strokeLinecap="round" aria-hidden="true">
      <path d="M2 10C6 -1 11 -1 16 10S26 21 30 10" className="stroke-copper" />
      <path d="M2 10C6 21 11 21 16 10S26 -1 30 10" className="stroke-copper" opacity="0.55" />
    </svg>
  );
}
