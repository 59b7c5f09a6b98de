import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { ConditionColumnNode, InputNode, SheetDocument, Text } from '../sheet/document.ts';
import { LIMITS } from '../sheet/limits.ts';
import { overrideFile, type Override } from './request.ts';

/** What stands for each input: its own text, or the one that is set from outside in its place. */
export class Overrides {
  readonly diagnostics: readonly Diagnostic[];
  private readonly set: ReadonlyMap<string, Text>;

  constructor(document: SheetDocument, overrides: readonly Override[]) {
    const columns = document.conditions?.columns ?? [];
    const names = [...document.inputs, ...columns].map(({ name }) => name.text);
    this.set = new Map(overrides.map(({ name, value }) => [name, overrideText(name, value)]));
    this.diagnostics = overrides.flatMap(({ name, value }) => faults(name, value, names));
  }

  /** The text that is read for an input, and whether it is set from outside. */
  of({ name, value }: InputNode): { readonly text: Text; readonly isSet: boolean } {
    const set = this.set.get(name.text);
    return { text: set ?? value, isSet: set !== undefined };
  }

  /** A value that is set for a column holds for every operating condition. */
  cellsOf({ name, cells }: ConditionColumnNode): readonly Text[] {
    const set = this.set.get(name.text);
    return set === undefined ? cells : cells.map(() => set);
  }
}

function overrideText(name: string, value: string): Text {
  return { text: value, span: { file: overrideFile(name), start: 0, end: value.length } };
}

function faults(name: string, value: string, names: readonly string[]): Diagnostic[] {
  const { span } = overrideText(name, value);
  if (value.length > LIMITS.override) {
    return [error('OVERRIDE', span, 'the value is longer than a value may be')];
  }
  if (names.includes(name)) return [];
  const near = nearest(name, names);
  const hint = near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : 'only inputs of the sheet can be set';
  return [error('OVERRIDE', span, `the sheet has no input \`${name}\``, { hints: [hint] })];
}
