import type { LocatedDiagnostic } from '../diagnostics/located-diagnostic.ts';
import type { Printed } from '../units/printed.ts';

export type { LocatedDiagnostic, Printed };

/** `sha256-` and 64 hexadecimal digits. */
export type Digest = string;

/** One value of the sheet. `si` and `value` are numbers, or nested arrays where `axes` is not empty. */
export interface Quantity {
  readonly value: number;
  readonly unit: string;
  readonly si: number;
  /** Name of the dimension and kind: `force`, `pressure level`, `pressure difference`. */
  readonly dimension: string;
  readonly axes: readonly { readonly name: string; readonly values: readonly (string | number)[] }[];
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

export interface InputBlock extends BlockBase {
  readonly block: 'input';
  readonly name: string;
  /** TeX. */
  readonly symbol: string;
  /** As typed in the sheet. */
  readonly typed: string;
  readonly printed: Printed;
  readonly hold?: string;
}

export interface StepBlock extends BlockBase {
  readonly block: 'step';
  readonly name: string;
  readonly symbol: string;
  /** The formula as typed. */
  readonly calc: string;
  /** TeX of the right-hand side in symbols, and with numbers and units put in. */
  readonly formula: string;
  readonly substituted: string;
  readonly printed: Printed;
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
  readonly uses: readonly string[];
}

export interface TextBlock extends BlockBase {
  readonly block: 'text';
  /** Markdown with formulas between dollar signs. */
  readonly markdown: string;
}

export interface GasBlock extends BlockBase {
  readonly block: 'gas';
  readonly name: string;
  readonly method: string;
  readonly fractions: readonly { readonly component: string; readonly percent: string }[];
}

export interface AssumptionBlock extends BlockBase {
  readonly block: 'assumption';
  readonly text: string;
}

export type Block = InputBlock | StepBlock | CheckBlock | TextBlock | GasBlock | AssumptionBlock;

export interface ReportSection {
  /** `inputs`, `gases`, `assumptions`, or `sections/1`. */
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
    readonly governing: { readonly path: string; readonly label: string; readonly utilisation: number } | null;
  };
  readonly quantities: Readonly<Record<string, Quantity>>;
  readonly checks: readonly CheckResult[];
  readonly holds: readonly Hold[];
  readonly sections: readonly ReportSection[];
  readonly sources: readonly { readonly id: string; readonly text: string }[];
  readonly cautions: readonly string[];
  readonly diagnostics: readonly LocatedDiagnostic[];
}
