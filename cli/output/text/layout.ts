import { stripVTControlCharacters } from 'node:util';
import { displayWidth } from '../../../core/diagnostics/display-text.ts';
import type { Block, Extreme, Printed } from '../../../core/report/model.ts';
import type { Paint } from '../../terminal.ts';

/** Columns that text keeps to where it can. */
export const WIDTH = 88;
export const INDENT = '   ';
/** Under a line, what is said about it. */
export const DETAIL_INDENT = '      ';

export function plain({ number, unit }: Printed): string {
  return unit === '' ? number : `${number} ${unit}`;
}

export function widest(texts: readonly string[]): number {
  return texts.reduce((width, text) => Math.max(width, displayWidth(text)), 0);
}

export function padEnd(text: string, width: number): string {
  return text + ' '.repeat(Math.max(0, width - displayWidth(text)));
}

export function padStart(text: string, width: number): string {
  return ' '.repeat(Math.max(0, width - displayWidth(text))) + text;
}

export function fits(text: string): boolean {
  return displayWidth(text) <= WIDTH;
}

/** Fills lines with words. */
export function wrap(text: string, first: string, following = ' '.repeat(first.length), width = WIDTH): string[] {
  return fill(wordsOf(text), first, following, width);
}

function wordsOf(text: string): string[] {
  return text.trim().split(/[ \n]+/);
}

/** Fills lines with pieces that are not broken; one that is longer than a line has a line to itself. */
function fill(pieces: readonly string[], first: string, following: string, width = WIDTH): string[] {
  const lines: string[] = [];
  let [line, isEmpty] = [first, true];
  for (const piece of pieces) {
    if (!isEmpty && shownWidth(line) + shownWidth(piece) + 1 > width) {
      lines.push(line);
      [line, isEmpty] = [following, true];
    }
    line += isEmpty ? piece : ` ${piece}`;
    isEmpty = false;
  }
  return [...lines, line];
}

/** Columns that text takes, without the codes of its colours. */
export function shownWidth(text: string): number {
  return displayWidth(stripVTControlCharacters(text));
}

/** Something said about a line: pieces between which it may be broken. */
export type Detail = readonly string[];

/** What is said about the line above, one after the other. */
export function detailLines(details: readonly Detail[], paint: (text: string) => string): string[] {
  const pieces = details.flatMap((detail, i) => (i > 0 ? ['·', ...detail] : detail));
  return pieces.length === 0 ? [] : fill(pieces, DETAIL_INDENT, DETAIL_INDENT).map(paint);
}

export function proseDetail(text: string): Detail {
  return wordsOf(text);
}

export function noteLines(block: Block, paint: Paint): string[] {
  return block.note === undefined ? [] : detailLines([proseDetail(block.note)], (text) => paint('dim', text));
}

/** Where the least and the greatest of several values are; nothing where there is but one. */
export function extentDetail(
  extent: { readonly least: Extreme; readonly greatest: Extreme } | undefined,
  paint: Paint,
): Detail[] {
  if (extent === undefined) return [];
  const { least, greatest } = extent;
  if (least.at === greatest.at) return [];
  const [low, high] = [plain(least.printed), plain(greatest.printed)];
  const pieces =
    low === high
      ? ['the same at all points']
      : [`least ${low}`, `at ${least.at},`, `greatest ${high}`, `at ${greatest.at}`];
  return [pieces.map((piece) => paint('dim', piece))];
}

/** A blank line between groups, and none before, behind or beside another. */
export function spaced(groups: readonly (readonly string[])[]): string[] {
  return groups.filter((lines) => lines.length > 0).flatMap((lines, i) => (i > 0 ? ['', ...lines] : lines));
}
