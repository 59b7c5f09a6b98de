import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { isReservedName } from '../expression/names.ts';
import { checkSymbol } from '../expression/tex-symbol.ts';
import type { SheetDocument } from '../sheet/document.ts';

/**
 * Names that formulas could not tell from constants and built-in functions, and symbols that are not TeX of the closed
 * list of commands, are refused before anything is typeset.
 */
export function checkLabels({ gases, inputs, sections }: SheetDocument): Diagnostic[] {
  const named = [...inputs, ...sections.flatMap(({ steps }) => steps)];
  const reserved = [...gases, ...named].filter(({ name }) => isReservedName(name.text));
  return [
    ...reserved.map(({ name }) =>
      error('NAME_RESERVED', name.span, `\`${name.text}\` is the name of a constant or a function`, {
        hints: ['give it another name, such as one with a subscript: `e_1`'],
      }),
    ),
    ...named.flatMap(({ symbol }) => (symbol === undefined ? [] : checkSymbol(symbol.text, symbol.span))),
  ];
}
