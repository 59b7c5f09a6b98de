import type { LocatedDiagnostic } from '../diagnostics/located-diagnostic.ts';
import type { Nested } from '../axes/column.ts';
import type { Printed } from '../units/printed.ts';

export type { LocatedDiagnostic, Printed };

/** `sha256-` and 64 hexadecimal digits. */
export type Digest = string;

/** An axis of the sheet: ids of operating conditions, or values in a unit. */
export interface ReportAxis {
  readonly name: string;
  readonly values: readonly (string | number)[];
  readonly unit?: string;
}

/** One value of the sheet. `si` and `value` are numbers, or nested arrays where `axes` is not empty. */
export interface Quantity {
  readonly value: Nested;
  readonly unit: string;
  readonly si: Nested;
  /** Name of the dimension and kind: `force`, `pressure level`, `pressure difference`. */
  readonly dimension: string;
  readonly axes: readonly ReportAxis[];
  readonly label: string;
  readonly digest: Digest;
  readonly printed: Printed;
  /** Path of the block that defines it. */
  readonly path: string;
}

interface BlockBase {
  /** Stable path: `inputs/p_d`, `sections/2/steps/F_run` (sections count from 1). */
  readonly path: string;
  readonly digest: Digest;
  readonly label: string;
  readonly note?: string;
  /** Text of the source, resolved from the sheet's `sources`. */
  readonly source?: string;
  /** Place in the sheet, for editors and the trace. */
  readonly place: { readonly file: string; readonly line: number };
}

/** The least or the greatest of the values over some axes, and where it is: `C07, 1130 rpm`. */
export interface Extreme {
  readonly printed: Printed;
  readonly at: string;
}

/** What a block over axes says of all its values. */
interface Spread {
  /** Names of the axes, outermost first; not there for a single value. */
  readonly axes?: readonly string[];
  readonly extent?: { readonly least: Extreme; readonly greatest: Extreme };
}

/** The range in which an experienced engineer would believe a value, as typed, and whether the value lies in it. */
export interface Expectation {
  readonly range: string;
  readonly within: boolean;
}

export interface InputBlock extends BlockBase, Spread {
  readonly block: 'input';
  readonly name: string;
  /** TeX. */
  readonly symbol: string;
  /** As typed in the sheet. */
  readonly typed: string;
  readonly printed: Printed;
  readonly hold?: string;
  /** Of a column of the operating conditions: the printed value of each. */
  readonly cells?: readonly string[];
  /** How far it may be off, as typed. */
  readonly tolerance?: string;
  readonly expect?: Expectation;
}

/** A column of gases or of words among the operating conditions. */
export interface ColumnBlock extends BlockBase {
  readonly block: 'column';
  readonly name: string;
  readonly holds: 'gas' | 'text';
  readonly cells: readonly string[];
  readonly hold?: string;
}

/** A value of another sheet's revision. */
export interface TakenBlock extends BlockBase, Spread {
  readonly block: 'taken';
  readonly name: string;
  readonly symbol: string;
  /** `TH3-C-102@0#T_d`. */
  readonly from: string;
  /** Digest of the report that the value was taken from. */
  readonly revision: string;
  readonly printed: Printed;
}

/** A table that formulas interpolate in. */
export interface LookupBlock extends BlockBase {
  readonly block: 'lookup';
  readonly name: string;
  readonly symbol: string;
  readonly columns: readonly { readonly name: string; readonly unit: string }[];
  readonly rows: readonly (readonly string[])[];
}

export interface StepBlock extends BlockBase, Spread {
  readonly block: 'step';
  readonly name: string;
  readonly symbol: string;
  /** The formula as typed. */
  readonly calc: string;
  /** TeX of the right-hand side in symbols, and with numbers and units put in. */
  readonly formula: string;
  readonly substituted: string;
  readonly printed: Printed;
  /** The case whose numbers are put in, where there are several. */
  readonly at?: string;
  readonly expect?: Expectation;
  /** Paths of the blocks it reads directly. */
  readonly uses: readonly string[];
  /** Names of library functions it calls, with their published source. */
  readonly methods: readonly { readonly function: string; readonly source: string; readonly validity: string }[];
}

export interface CheckBlock extends BlockBase {
  readonly block: 'check';
  readonly that: string;
  readonly formula: string;
  readonly substituted: string;
  readonly status: 'pass' | 'fail';
  /** Demand over limit; null where the limit is zero or the sides have opposite signs. */
  readonly utilisation: number | null;
  /** `within`, `close` (0.90 to 1.00) or `over`. */
  readonly standing: 'within' | 'close' | 'over';
  /** Names of the axes, outermost first; not there for a single value. */
  readonly axes?: readonly string[];
  /** Where it governs, by axis; empty without axes. */
  readonly governing: Readonly<Record<string, string | number>>;
  /** The same in words: `C07, 1130 rpm`. */
  readonly at?: string;
  /** How many points there are, and at how many it fails; not there for a single value. */
  readonly points?: { readonly all: number; readonly failed: number };
  readonly uses: readonly string[];
}

export interface TextBlock extends BlockBase {
  readonly block: 'text';
  /** Markdown with formulas between dollar signs; values stand in the place of their names. */
  readonly markdown: string;
  /** Paths of the blocks whose values it shows. */
  readonly uses: readonly string[];
}

/** Quantities side by side, row by row along an axis. */
export interface TableBlock extends BlockBase {
  readonly block: 'table';
  /** Name of the axis; not there where all columns are single values, in one row. */
  readonly axis?: string;
  readonly columns: readonly {
    readonly name: string;
    readonly label: string;
    readonly symbol: string;
    readonly unit: string;
  }[];
  readonly rows: readonly { readonly at: string; readonly cells: readonly string[] }[];
  readonly uses: readonly string[];
}

/** A quantity over one axis or two, ready to be drawn. */
export interface FigureBlock extends BlockBase {
  readonly block: 'figure';
  readonly kind: 'line' | 'spectrum' | 'matrix' | 'wave' | 'profile';
  /** What is shown, as typed. */
  readonly of: string;
  /** TeX of what is shown. */
  readonly formula: string;
  readonly unit: string;
  readonly x: ReportAxis;
  /** One series for each point of the second axis; one without a label where there is none. */
  readonly series: readonly { readonly label: string; readonly values: readonly number[] }[];
  readonly seriesAxis?: string;
  /** What it is held against: one value, or one for each point of `x`. */
  readonly limit?: { readonly of: string; readonly formula: string; readonly values: readonly number[] };
  readonly greatest: Extreme;
  readonly uses: readonly string[];
}

export interface GasBlock extends BlockBase {
  readonly block: 'gas';
  readonly name: string;
  readonly method: string;
  readonly fractions: readonly { readonly component: string; readonly percent: string; readonly tolerance?: string }[];
}

/** A statement: what is assumed, what is left out, or a document for further reading. */
export interface StatementBlock extends BlockBase {
  readonly block: 'assumption' | 'exclusion' | 'reference';
  readonly text: string;
}

export type Block =
  | InputBlock
  | ColumnBlock
  | TakenBlock
  | LookupBlock
  | StepBlock
  | CheckBlock
  | TextBlock
  | TableBlock
  | FigureBlock
  | GasBlock
  | StatementBlock;

export interface ReportSection {
  /** `inputs`, `taken`, `conditions`, `gases`, `tables`, `assumptions`, `exclusions`, `references`, or `sections/1`. */
  readonly path: string;
  readonly title: string;
  readonly blocks: readonly Block[];
  /** Worst utilisation among its checks; null without checks. */
  readonly utilisation: number | null;
}

export interface CheckResult {
  readonly path: string;
  readonly that: string;
  readonly label: string;
  readonly status: 'pass' | 'fail';
  readonly utilisation: number | null;
  /** Where along the axes the check is worst; empty without axes. */
  readonly governing: Readonly<Record<string, string | number>>;
}

export interface Hold {
  readonly path: string;
  readonly name: string;
  readonly label: string;
  readonly reason: string;
}

/** The canonical record of an evaluated sheet. Terminal, page, file and signature are views of it. */
export interface Report {
  readonly antinode: 'report/1';
  readonly core: string;
  readonly sheet: {
    readonly number: string;
    readonly title: string;
    readonly units: 'us' | 'si';
    /** Digest over the sheet's content: comments and the order of keys do not change it. */
    readonly digest: Digest;
    readonly atmosphere: Printed | null;
  };
  readonly summary: {
    readonly blocks: number;
    readonly passed: number;
    readonly failed: number;
    readonly holds: number;
    readonly governing: {
      readonly path: string;
      readonly label: string;
      readonly utilisation: number;
      readonly at?: string;
    } | null;
  };
  readonly axes: readonly ReportAxis[];
  readonly quantities: Readonly<Record<string, Quantity>>;
  readonly checks: readonly CheckResult[];
  readonly holds: readonly Hold[];
  readonly sections: readonly ReportSection[];
  readonly sources: readonly { readonly id: string; readonly text: string }[];
  readonly cautions: readonly string[];
  readonly diagnostics: readonly LocatedDiagnostic[];
}
