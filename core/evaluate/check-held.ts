import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { EvaluatedSheet, Value } from '../report/evaluated-sheet.ts';
import type { Text } from '../sheet/document.ts';
import { fromSi } from '../units/convert.ts';

/** A number that can be held in SI may be too large in the unit in which it is shown: 1e306 m in micrometres. */
export function checkHeld(sheet: EvaluatedSheet): Diagnostic[] {
  const { inputs, steps, taken, columns, figures, site, atmosphere, document } = sheet;
  const shown: { readonly at: Text; readonly value: Value }[] = [
    ...[...inputs.values(), ...steps.values(), ...taken.values()].map(({ node, value }) => ({ at: node.name, value })),
    ...columns.flatMap((column) =>
      column.column === 'quantity' ? [{ at: column.node.name, value: column.value }] : [],
    ),
    ...[...figures.values()].flatMap(({ node, value, limit }) => [
      { at: node.of, value },
      ...(limit === null ? [] : [{ at: node.of, value: limit.value }]),
    ]),
    ...(atmosphere === null || document.atmosphere === undefined
      ? []
      : [{ at: document.atmosphere, value: atmosphere }]),
  ];
  return shown.flatMap(({ at, value: { column, unit } }) => {
    if (column.data.every((si) => Number.isFinite(fromSi(si, unit, site)))) return [];
    return [
      error('RESULT_NOT_FINITE', at.span, `the value is too large to be held in \`${unit.text}\``, {
        hints: ['look for a wrong power or unit among the values, or show it in a larger unit'],
      }),
    ];
  });
}
