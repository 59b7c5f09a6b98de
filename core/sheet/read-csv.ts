import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { Text } from './document.ts';

/**
 * Cells of a CSV file (RFC 4180), each with its place. A line that is empty or begins with `#` is left out.
 *
 * Quoted cells may hold commas, doubled quotation marks and line ends.
 */
export function readCsv(
  file: string,
  text: string,
): { readonly rows: readonly Text[][]; readonly diagnostics: Diagnostic[] } {
  const rows: Text[][] = [];
  const diagnostics: Diagnostic[] = [];
  let at = text.startsWith('\uFEFF') ? 1 : 0;
  while (at < text.length) {
    const row: Text[] = [];
    for (let more = true; more;) {
      const cell = readCell(file, text, at);
      row.push(cell.text);
      if (cell.open) diagnostics.push(unclosed(file, at));
      more = text[cell.end] === ',';
      at = cell.end + (more ? 1 : 0);
    }
    at += text.startsWith('\r\n', at) ? 2 : 1;
    const [first] = row;
    const isLeftOut = first === undefined || first.text.startsWith('#') || row.every((cell) => cell.text === '');
    if (!isLeftOut) rows.push(row);
  }
  return { rows, diagnostics };
}

const QUOTED = /[ \t]*"((?:[^"]|"")*)("?)[^,\r\n]*/y;
const BARE = /[^,\r\n]*/y;

function readCell(file: string, text: string, at: number): { text: Text; end: number; open: boolean } {
  QUOTED.lastIndex = at;
  const quoted = QUOTED.exec(text);
  if (quoted !== null) {
    const inside = quoted[1] ?? '';
    const start = at + quoted[0].indexOf('"') + 1;
    const end = at + quoted[0].length;
    const cell = { text: inside.replaceAll('""', '"'), span: { file, start, end: start + inside.length } };
    return { text: cell, end, open: quoted[2] === '' };
  }
  BARE.lastIndex = at;
  const bare = BARE.exec(text)?.[0] ?? '';
  const start = at + bare.length - bare.trimStart().length;
  const trimmed = bare.trim();
  return {
    text: { text: trimmed, span: { file, start, end: start + trimmed.length } },
    end: at + bare.length,
    open: false,
  };
}

function unclosed(file: string, at: number): Diagnostic {
  return error('CSV_SYNTAX', { file, start: at, end: at + 1 }, 'a quoted cell is not closed', {
    hints: ['a quotation mark inside a quoted cell is doubled'],
  });
}
