import { visible } from '../../core/diagnostics/display-text.ts';

/** Text of several lines, with nothing in it that a terminal would obey. */
export function harmlessText(text: string): string {
  return text.split(/\r?\n/).map(visible).join('\n');
}

/** A copy of plain data with every text made harmless: sheets and servers hold what other people wrote. */
export function harmless<T>(data: T): T {
  return JSON.parse(JSON.stringify(data), (_, value: unknown) =>
    typeof value === 'string' ? harmlessText(value) : value,
  ) as T;
}
