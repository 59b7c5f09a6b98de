import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { checkSymbol } from '../expression/tex-symbol.ts';
import type { SheetDocument } from '../sheet/document.ts';

/** The symbols that the engineer gives are TeX of a closed list of commands; whatever else is refused before it is typeset. */
export function checkSymbols({ inputs, sections }: SheetDocument): Diagnostic[] {
  const named = [...inputs, ...sections.flatMap(({ steps }) => steps)];
  return named.flatMap(({ symbol }) => (symbol === undefined ? [] : checkSymbol(symbol.text, symbol.span)));
}
