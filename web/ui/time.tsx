import { formatDay, formatTime } from '../lib/dates.ts';

/** A day or a moment on the page; the machine-readable time goes with it, and the moment stands in its title. */
export function Time({ iso, precise = false }: { readonly iso: string; readonly precise?: boolean }) {
  return (
    <time dateTime={iso} title={formatTime(iso)} className="whitespace-nowrap">
      {precise ? formatTime(iso) : formatDay(iso)}
    </time>
  );
}
