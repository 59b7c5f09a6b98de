import type { Report } from '../../core/report/model.ts';

/**
 * The line that stands on top of each printed page, and its page x of y. Margin boxes are the one way to repeat text
 * on every page without laying it over the content; their text can only be given in the style sheet itself.
 */
export function pageStyle(report: Report, revision?: string): string {
  const { number, title } = report.sheet;
  const name = revision === undefined ? number : `${number} revision ${revision}`;
  return `@page{@top-left{content:${cssString(name)}}@top-center{content:${cssString(title)}}}`;
}

/** A CSS string in which every character that could end it, or the style element around it, is written by its number. */
function cssString(text: string): string {
  const escaped = text.replace(
    /[^\p{L}\p{N} .,-]/gu,
    (character) => `\\${(character.codePointAt(0) ?? 0).toString(16)} `,
  );
  return `"${escaped}"`;
}
