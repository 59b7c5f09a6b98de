/** Columns that a tab takes in a shown source line. */
const TAB = '  ';

/** Characters that turn, hide or break the line they stand in: shown by their number, never sent to a terminal as they are. */
const HARMFUL = /[\u0000-\u001F\u007F-\u009F\u200B\u200E\u200F\u2028-\u202E\u2060-\u2069\uFEFF]|\p{Surrogate}/gu;

/** Text from a file or a name, safe to print on one line: tabs as spaces, control and direction characters as `<U+001B>`. */
export function visible(text: string): string {
  return text.replace(HARMFUL, (character) => {
    if (character === '\t') return TAB;
    const code = character.codePointAt(0) ?? 0;
    return `<U+${code.toString(16).toUpperCase().padStart(4, '0')}>`;
  });
}

/** Columns that text takes in a terminal: wide East Asian characters and emoji take two, combining marks none. */
export function displayWidth(text: string): number {
  let width = 0;
  for (const character of text) width += COMBINING.test(character) ? 0 : isWide(character.codePointAt(0) ?? 0) ? 2 : 1;
  return width;
}

const COMBINING = /^[\p{Mn}\p{Me}\u200C\u200D\uFE00-\uFE0F]$/u;

/** Ranges of Unicode Standard Annex 11 with East Asian Width W or F, joined where only unassigned points lie between. */
const WIDE: readonly (readonly [first: number, last: number])[] = [
  [0x1100, 0x115f],
  [0x231a, 0x231b],
  [0x2e80, 0x303e],
  [0x3041, 0x4dbf],
  [0x4e00, 0xa4cf],
  [0xa960, 0xa97f],
  [0xac00, 0xd7a3],
  [0xf900, 0xfaff],
  [0xfe30, 0xfe6f],
  [0xff00, 0xff60],
  [0xffe0, 0xffe6],
  [0x1f300, 0x1f64f],
  [0x1f680, 0x1f6ff],
  [0x1f900, 0x1f9ff],
  [0x20000, 0x3fffd],
];

function isWide(code: number): boolean {
  return code >= 0x1100 && WIDE.some(([first, last]) => code >= first && code <= last);
}
