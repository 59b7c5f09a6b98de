import { error, warning, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import { buildGas, type GasFault } from '../gas/build-gas.ts';
import type { EvaluatedGas } from '../report/evaluated-sheet.ts';
import type { GasNode, SheetDocument } from '../sheet/document.ts';
import { isNumber } from '../units/dimensions.ts';
import { parseQuantity } from '../units/parse-quantity.ts';

export interface Gases {
  readonly gases: ReadonlyMap<string, EvaluatedGas>;
  readonly diagnostics: readonly Diagnostic[];
}

/** Reads the compositions of all gases of the sheet. */
export function readGases(document: SheetDocument): Gases {
  const gases = new Map<string, EvaluatedGas>();
  const diagnostics: Diagnostic[] = [];
  for (const node of document.gases) {
    const read = readGas(node);
    diagnostics.push(...read.diagnostics);
    if (read.gas !== null) gases.set(node.name.text, read.gas);
  }
  return { gases, diagnostics };
}

function readGas(node: GasNode): { gas: EvaluatedGas | null; diagnostics: readonly Diagnostic[] } {
  const amounts = node.fractions.map(({ component, amount }) => ({
    component: component.text,
    read: readAmount(amount),
  }));
  const diagnostics = amounts.flatMap(({ read }) => read.diagnostics);
  if (diagnostics.length > 0) return { gas: null, diagnostics };
  const built = buildGas(
    node.name.text,
    node.method?.text,
    amounts.map(({ component, read }) => ({ component, value: read.value })),
  );
  const found = built.faults.map((fault) => {
    const make = fault.severity === 'warning' ? warning : error;
    return make(fault.code, placeOf(node, fault), fault.message, { hints: [...nearNames(fault), ...fault.hints] });
  });
  return { gas: built.gas === undefined ? null : { node, model: built.gas }, diagnostics: found };
}

function readAmount({ text, span }: { text: string; span: Span }): {
  value: number;
  diagnostics: readonly Diagnostic[];
} {
  const { value, diagnostics } = parseQuantity(text, span);
  if (value === undefined) return { value: Number.NaN, diagnostics };
  if (isNumber(value.unit.dimension)) return { value: value.number * value.unit.factor, diagnostics };
  const fault = error('UNIT_MISMATCH', span, `a share of the gas is wanted, and \`${value.unit.text}\` is given`, {
    hints: ['write mole percent: `91.3 %`'],
  });
  return { value: Number.NaN, diagnostics: [fault] };
}

function nearNames({ unknown }: GasFault): string[] {
  if (unknown === undefined) return [];
  const near = nearest(unknown.name, unknown.known, 2);
  return [near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : `known are ${unknown.known.join(', ')}`];
}

/** The component's place when the fault is about one, else the method's or the gas's name. */
function placeOf(node: GasNode, { index, code }: GasFault): Span {
  const fraction = index === undefined ? undefined : node.fractions[index];
  if (fraction !== undefined) return (code === 'GAS_FRACTIONS' ? fraction.amount : fraction.component).span;
  return (code === 'GAS_METHOD' && node.method !== undefined ? node.method : node.name).span;
}
