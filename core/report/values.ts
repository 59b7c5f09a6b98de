import type { EvaluatedSheet, TypedNumber, Value } from './evaluated-sheet.ts';

/** A value of the sheet by its name, with what decides how it is printed. */
export interface NamedValue {
  readonly value: Value;
  readonly digits: number | undefined;
  readonly typed: TypedNumber | null;
}

/** The value that a name stands for, wherever it is defined; undefined for gases, tables and words. */
export function valueOf(name: string, sheet: EvaluatedSheet): NamedValue | undefined {
  const input = sheet.inputs.get(name);
  if (input !== undefined) return { value: input.value, digits: input.node.digits, typed: input.typed };
  const other = sheet.steps.get(name) ?? sheet.taken.get(name) ?? columnOf(name, sheet);
  return other && { value: other.value, digits: other.node.digits, typed: null };
}

function columnOf(
  name: string,
  { columns }: EvaluatedSheet,
): (EvaluatedSheet['columns'][number] & { column: 'quantity' }) | undefined {
  const found = columns.find(({ node }) => node.name.text === name);
  return found?.column === 'quantity' ? found : undefined;
}
