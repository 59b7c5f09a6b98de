import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { suggestUnits } from '../units/parse-unit.ts';

/** A word stands where a unit is wanted; says which units were probably meant. */
export function unknownUnit(text: string, span: Span, furtherHints: readonly string[] = []): Diagnostic {
  const near = suggestUnits(text);
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : '`antinode units` lists all units';
  return error('UNIT_UNKNOWN', span, `\`${text}\` is not a unit`, { hints: [hint, ...furtherHints] });
}
