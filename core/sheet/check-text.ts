import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { LIMITS } from './limits.ts';

// Tab, line feed and carriage return are text; the other control characters are not.
const CONTROL = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F-\u0084\u0086-\u009F\uFFFE\uFFFF]/;

/** Looks at the text before any parser does. Null when it may be parsed. */
export function checkText(file: string, text: string): Diagnostic | null {
  if (text.length > LIMITS.characters) {
    const message = `the sheet has ${text.length} characters, more than ${LIMITS.characters}`;
    return error('FILE_TOO_LARGE', { file, start: 0, end: 0 }, message, { hints: ['split the sheet'] });
  }
  const control = text.search(CONTROL);
  if (control >= 0) {
    const code = (text.codePointAt(control) ?? 0).toString(16).toUpperCase().padStart(4, '0');
    return error(
      'YAML_SYNTAX',
      { file, start: control, end: control + 1 },
      `the text holds the control character U+${code}`,
      {
        hints: ['remove it; is the file text at all?'],
      },
    );
  }
  const broken = text.search(LONE_SURROGATE);
  if (broken >= 0) return brokenText({ file, start: broken, end: broken + 1 });
  const many = beyondValues(text);
  if (many !== null) {
    return error('LIMIT_EXCEEDED', { file, start: many, end: many + 1 }, TOO_MANY, { hints: ['split the sheet'] });
  }
  const deep = deepBracket(text);
  return deep === null ? null : error('YAML_TOO_DEEP', { file, start: deep, end: deep + 1 }, TOO_DEEP);
}

/** Half of a character: UTF-8 cannot write it, and no digest can be made of it. */
const LONE_SURROGATE = /\p{Surrogate}/u;

export function isBroken(text: string): boolean {
  return LONE_SURROGATE.test(text);
}

export function brokenText(span: Span): Diagnostic {
  return error('YAML_SYNTAX', span, 'the text holds half of a character', {
    hints: ['characters beyond U+FFFF are written whole, or by one escape with `\\U`'],
  });
}

export const TOO_MANY = `the sheet has more than ${LIMITS.values} values`;

/** Offset at which a text has more separators than a sheet may have values; before a parser spends its time on them. */
function beyondValues(text: string): number | null {
  let separators = 0;
  for (let at = 0; at < text.length; at += 1) {
    const character = text.charCodeAt(at);
    if (character === 0x2c || character === 0x3a) separators += 1;
    if (separators > LIMITS.values * 2) return at;
  }
  return null;
}

export const TOO_DEEP = `the sheet is nested more than ${LIMITS.depth} deep`;

/**
 * Offset of the bracket at which flow collections are nested too deep. Quotes and comments are not looked for: prose never
 * has so many open brackets, and a parser that recurses must not see them.
 */
function deepBracket(text: string): number | null {
  let depth = 0;
  for (let at = 0; at < text.length; at += 1) {
    const character = text.charCodeAt(at);
    if (character === 0x5b || character === 0x7b) depth += 1;
    else if ((character === 0x5d || character === 0x7d) && depth > 0) depth -= 1;
    if (depth > LIMITS.depth * 5) return at;
  }
  return null;
}
