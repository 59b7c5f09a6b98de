import { Logo } from './logo.tsx';

/** Shown until the first answer of the server says who is there: the frame of every page, without its content. */
export function Waiting() {
  return (
    <header
      className="flex items-center gap-2.5 border-b border-rule px-4 py-3 text-[1.0625rem] font-bold tracking-tight sm:px-7"
      role="status"
      aria-label="Loading"
    >
      <Logo /> Antinode
    </header>
  );
}
