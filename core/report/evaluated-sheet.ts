import type { AxisTable } from '../axes/axis.ts';
import type { Column } from '../axes/column.ts';
import type { Shape } from '../axes/shape.ts';
import type { LookupTable } from '../expression/lookup-table.ts';
import type { Comparison, Expression, Formula } from '../expression/tree.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { LibraryFunction } from '../library/function.ts';
import type {
  CheckNode,
  ConditionColumnNode,
  FigureNode,
  GasNode,
  InputNode,
  LookupNode,
  SheetDocument,
  StepNode,
  TakeNode,
  Text,
} from '../sheet/document.ts';
import type { QuantityType } from '../units/dimension.ts';
import type { Site } from '../units/site.ts';
import type { Unit } from '../units/unit.ts';

/** A value, or the values over some axes, with the type they share and the unit in which they are shown. */
export interface Value {
  readonly type: QuantityType;
  readonly column: Column;
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

/** One column of the operating conditions. */
export type EvaluatedColumn = { readonly node: ConditionColumnNode; readonly cells: readonly Text[] } & (
  | { readonly column: 'gas' | 'text' }
  | {
      readonly column: 'quantity';
      readonly value: Value;
      /** As typed, for each cell that is shown in the unit it was typed in. */
      readonly typed: readonly (TypedNumber | null)[];
    }
);

export interface EvaluatedStep {
  readonly node: StepNode;
  readonly formula: Formula;
  readonly value: Value;
}

export interface EvaluatedCheck {
  readonly node: CheckNode;
  readonly comparison: Comparison;
  readonly passes: boolean;
  /** Axes of the check, and the cell that governs it. */
  readonly axes: Shape;
  readonly cell: number;
  /** How many cells there are, and how many fail. */
  readonly cells: number;
  readonly failures: number;
  /** Demand over limit; null where the two have no meaningful ratio. */
  readonly utilisation: number | null;
}

export interface EvaluatedGas {
  readonly node: GasNode;
  readonly model: GasModel;
}

export interface EvaluatedLookup {
  readonly node: LookupNode;
  readonly table: LookupTable;
}

/** A value of another sheet's revision. */
export interface EvaluatedTake {
  readonly node: TakeNode;
  readonly value: Value;
  /** Digest of the revision that the value was taken from. */
  readonly revision: string;
}

export interface EvaluatedFigure {
  readonly node: FigureNode;
  readonly of: Expression;
  readonly value: Value;
  readonly limit: { readonly expression: Expression; readonly value: Value } | null;
}

/** A sheet with all its values: what the report is made of. */
export interface EvaluatedSheet {
  readonly document: SheetDocument;
  readonly units: 'us' | 'si';
  readonly site: Site;
  readonly atmosphere: (Value & { readonly typed: TypedNumber | null }) | null;
  readonly gases: readonly EvaluatedGas[];
  readonly inputs: ReadonlyMap<string, EvaluatedInput>;
  readonly columns: readonly EvaluatedColumn[];
  readonly taken: ReadonlyMap<string, EvaluatedTake>;
  readonly lookups: readonly EvaluatedLookup[];
  readonly steps: ReadonlyMap<string, EvaluatedStep>;
  readonly figures: ReadonlyMap<FigureNode, EvaluatedFigure>;
  /** For each name with an expected range: whether all its values lie in it. */
  readonly expectations: ReadonlyMap<string, boolean>;
  /** In the order of `document.sections[].checks`. */
  readonly checks: ReadonlyMap<CheckNode, EvaluatedCheck>;
  readonly functions: ReadonlyMap<string, LibraryFunction>;
  readonly axes: AxisTable;
}
