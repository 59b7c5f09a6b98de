import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { suggestUnits } from './parse-unit.ts';

/** A sheet's text may be long; a message quotes the start of it. */
const LONGEST_QUOTE = 40;

/** A word stands where a unit is wanted; says which units were probably meant. */
export function unknownUnit(text: string, span: Span, furtherHints: readonly string[] = []): Diagnostic {
  const near = suggestUnits(text);
  const shown = text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE)}…` : text;
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : '`antinode units` lists all units';
  return error('UNIT_UNKNOWN', span, `\`${shown}\` is not a unit`, { hints: [hint, ...furtherHints] });
}
