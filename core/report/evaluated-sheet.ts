import type { Comparison, Formula } from '../expression/tree.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction } from '../library/function.ts';
import type { CheckNode, GasNode, InputNode, SheetDocument, StepNode } from '../sheet/document.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Site } from '../units/site.ts';
import type { Unit } from '../units/unit.ts';

/** A value with its type, and the unit in which it is shown. */
export interface Value {
  readonly type: QuantityType;
  readonly si: number;
  readonly unit: Unit;
}

/** A number as it was typed: no conversion to SI and back may change a digit of it. */
export interface TypedNumber {
  readonly number: number;
  readonly text: string;
}

export interface EvaluatedInput {
  readonly node: InputNode;
  readonly value: Value;
  /** Null where the value is shown in another unit than it was typed in. */
  readonly typed: TypedNumber | null;
}

export interface EvaluatedStep {
  readonly node: StepNode;
  readonly formula: Formula;
  readonly value: Value;
}

export interface EvaluatedCheck {
  readonly node: CheckNode;
  readonly comparison: Comparison;
  readonly passes: boolean;
  /** Demand over limit; null where the two have no meaningful ratio. */
  readonly utilisation: number | null;
}

export interface EvaluatedGas {
  readonly node: GasNode;
  readonly model: GasModel;
}

/** A sheet with all its values: what the report is made of. */
export interface EvaluatedSheet {
  readonly document: SheetDocument;
  readonly units: 'us' | 'si';
  readonly site: Site;
  readonly atmosphere: (Value & { readonly typed: TypedNumber | null }) | null;
  readonly gases: readonly EvaluatedGas[];
  readonly inputs: ReadonlyMap<string, EvaluatedInput>;
  readonly steps: ReadonlyMap<string, EvaluatedStep>;
  /** In the order of `document.sections[].checks`. */
  readonly checks: ReadonlyMap<CheckNode, EvaluatedCheck>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
}
