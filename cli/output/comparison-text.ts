import type { Comparison } from '../../core/report/comparison.ts';
import type { Paint } from '../terminal.ts';
import { harmless } from './harmless.ts';
import { count } from './print-diagnostics.ts';
import { changeGroups } from './text/comparison-groups.ts';
import { fits, INDENT, spaced, wrap } from './text/layout.ts';

/** What changed between two sheets: what fails now comes first. */
export function comparisonText(written: Comparison, paint: Paint): string {
  const comparison = harmless(written);
  const groups = changeGroups(comparison).map(({ title, style, lines }) => [
    paint(style === undefined ? 'bold' : [style, 'bold'], title),
    ...lines.flatMap((line) => wrap(line, INDENT, `${INDENT}   `)),
  ]);
  const lines = spaced([sheetLines(comparison, paint), ...groups, [summaryLine(comparison)]]);
  return `${lines.join('\n')}\n`;
}

function sheetLines({ before, after }: Comparison, paint: Paint): string[] {
  const named = ({ number, title }: Comparison['before']): string => `${number}  ${title}`;
  if (named(before) === named(after)) return [paint('bold', named(after))];
  const both = `${named(before)} → ${named(after)}`;
  return (fits(both) ? [both] : [named(before), `→ ${named(after)}`]).map((line) => paint('bold', line));
}

function summaryLine({ before, after, affected, unchanged }: Comparison): string {
  if (before.digest === after.digest) return `no change: ${count(unchanged, 'block')} with equal digests`;
  const parts = [`${count(unchanged, 'block')} unchanged`];
  if (affected.length > 0) parts.push(`${count(affected.length, 'block')} affected by what changed`);
  return parts.join(' · ');
}
