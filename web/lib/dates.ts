const DAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'] as const;

/** A day as the report prints it: `2026-11-27 Fri`, in the reader's own zone unless one is given. */
export function formatDay(iso: string, timeZone?: string): string {
  const parts = partsOf(iso, timeZone);
  return parts === null ? iso : `${parts.date} ${parts.weekday}`;
}

/** A moment: `2026-11-27 Fri 14:05 GMT+1`. The zone is always said, since readers of one revision sit in several. */
export function formatTime(iso: string, timeZone?: string): string {
  const parts = partsOf(iso, timeZone);
  return parts === null ? iso : `${parts.date} ${parts.weekday} ${parts.time} ${parts.zone}`;
}

interface DateParts {
  readonly date: string;
  readonly weekday: string;
  readonly time: string;
  readonly zone: string;
}

function partsOf(iso: string, timeZone: string | undefined): DateParts | null {
  const moment = new Date(iso);
  if (Number.isNaN(moment.getTime())) return null;
  const format = new Intl.DateTimeFormat('en-GB', {
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZoneName: 'short',
    ...(timeZone === undefined ? {} : { timeZone }),
  });
  const found = new Map(format.formatToParts(moment).map(({ type, value }) => [type, value]));
  const part = (type: Intl.DateTimeFormatPartTypes) => found.get(type) ?? '';
  const date = `${part('year')}-${part('month')}-${part('day')}`;
  const weekday = DAYS[new Date(`${date}T00:00:00Z`).getUTCDay()] ?? '';
  return { date, weekday, time: `${part('hour')}:${part('minute')}`, zone: part('timeZoneName') };
}
