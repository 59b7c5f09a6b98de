import type { YAMLError } from 'yaml';
import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { DiagnosticCode } from '../diagnostics/codes.ts';

interface Words {
  readonly code?: DiagnosticCode;
  readonly message: string;
  readonly hints: readonly string[];
}

const INDENT = 'lines of one mapping start in the same column; what belongs to a key is indented further than the key';

/** The parser's faults in our own words. */
const WORDS: Readonly<Partial<Record<YAMLError['code'], Words>>> = {
  TAB_AS_INDENT: {
    code: 'YAML_TAB',
    message: 'a tab stands where YAML allows only spaces',
    hints: ['indent with spaces'],
  },
  BAD_INDENT: { message: 'the indentation does not fit the lines around it', hints: [INDENT] },
  UNEXPECTED_TOKEN: {
    message: 'this does not belong here',
    hints: ['look for a missing colon, quotation mark or dash before it'],
  },
  MISSING_CHAR: {
    message: 'a character is missing before this',
    hints: ['look for an unclosed quotation mark or bracket, or a missing colon or comma'],
  },
  BAD_SCALAR_START: { message: 'a plain value cannot start with this character', hints: ['put the value in quotes'] },
  BAD_DQ_ESCAPE: {
    message: 'the backslash has no meaning here in double quotes',
    hints: ['use single quotes for TeX and other text with backslashes'],
  },
  BLOCK_AS_IMPLICIT_KEY: {
    message: 'a mapping starts where a value stands on the line of its key',
    hints: ['put a value that holds `: ` in quotes'],
  },
  BLOCK_IN_FLOW: { message: 'an indented block stands inside brackets', hints: ['close the bracket first'] },
  MULTILINE_IMPLICIT_KEY: { message: 'a key runs over several lines', hints: ['look for a missing colon; ' + INDENT] },
  KEY_OVER_1024_CHARS: { message: 'a key is too long', hints: ['look for a missing colon'] },
  MULTIPLE_DOCS: {
    message: 'the file holds more than one YAML document',
    hints: ['a sheet is one document: remove the `---`'],
  },
  TAG_RESOLVE_FAILED: {
    message: 'a YAML tag is not known',
    hints: ['sheets use no tags; put a value that starts with `!` in quotes'],
  },
  BAD_ALIAS: {
    code: 'YAML_ALIAS',
    message: 'an alias names no anchor',
    hints: ['put a value that starts with `*` in quotes'],
  },
  BAD_DIRECTIVE: { message: 'a YAML directive cannot be read', hints: ['a comment starts with `#`'] },
};

/** Faults of the YAML text, each once and at its place. */
export function yamlFaults(file: string, text: string, errors: readonly YAMLError[]): Diagnostic[] {
  const seen = new Set<number>();
  return errors.flatMap((fault) => {
    const start = Math.min(fault.pos[0], text.length);
    if (seen.has(start)) return [];
    seen.add(start);
    const end = Math.max(start, Math.min(fault.pos[1], text.length, lineEnd(text, start)));
    const words = isTab(text, start) ? WORDS.TAB_AS_INDENT : WORDS[fault.code];
    const { code = 'YAML_SYNTAX', message, hints } = words ?? { message: 'this is not valid YAML', hints: [INDENT] };
    return [error(code, { file, start, end }, message, { hints })];
  });
}

/** The parser may meet a tab as something else; to the engineer the tab is the fault. */
function isTab(text: string, start: number): boolean {
  const lineStart = text.lastIndexOf('\n', Math.max(0, start - 1)) + 1;
  return /^[ ]*\t/.test(text.slice(lineStart, lineEnd(text, lineStart)));
}

function lineEnd(text: string, start: number): number {
  const end = text.indexOf('\n', start);
  return end < 0 ? text.length : Math.max(end, start);
}
