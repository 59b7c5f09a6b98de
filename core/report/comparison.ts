import type { Digest, Hold } from './model.ts';
import type { ValueChange } from './value-change.ts';

/** What changed between two revisions of a sheet. Plain JSON; terminal and page are views of it. */
export interface Comparison {
  readonly antinode: 'comparison/1';
  readonly before: ComparedSheet;
  readonly after: ComparedSheet;
  /** Checks that fail now and did not fail before, or were not there. */
  readonly newlyFailing: readonly CheckChange[];
  /** All other checks whose status, utilisation, governing point or text changed. */
  readonly checks: readonly CheckChange[];
  readonly holds: { readonly opened: readonly Hold[]; readonly closed: readonly Hold[] };
  readonly axes: readonly AxisChange[];
  /** Inputs, columns of conditions, taken values, gases and tables. */
  readonly inputs: readonly InputChange[];
  readonly formulas: readonly FormulaChange[];
  readonly results: readonly ResultChange[];
  readonly added: readonly BlockMention[];
  readonly removed: readonly BlockMention[];
  readonly texts: readonly TextChange[];
  /** Blocks whose own text is as before, but not all that they rest on. */
  readonly affected: readonly BlockMention[];
  /** Number of blocks that are as before with all that they rest on: their digests are equal. */
  readonly unchanged: number;
}

export interface ComparedSheet {
  readonly number: string;
  readonly title: string;
  readonly digest: Digest;
}

/** A block by its path in the later report; in the earlier one, where only that has it. */
export interface BlockMention {
  readonly path: string;
  readonly block: string;
  readonly label: string;
  /** Name, where it has one; of a check, what it demands. */
  readonly name?: string;
}

export interface CheckState {
  readonly that: string;
  readonly status: 'pass' | 'fail';
  readonly utilisation: number | null;
  readonly standing: 'within' | 'close' | 'over';
  readonly at?: string;
  readonly points?: { readonly all: number; readonly failed: number };
}

export interface CheckChange extends BlockMention {
  /** Null for a check that was not there. */
  readonly before: CheckState | null;
  readonly after: CheckState;
}

export interface AxisChange {
  readonly name: string;
  readonly unit?: string;
  readonly added: readonly (string | number)[];
  readonly removed: readonly (string | number)[];
}

export interface InputChange extends BlockMention {
  /** As typed. */
  readonly before: string;
  readonly after: string;
  /** Null for what is no number, and for a number that is only written otherwise. */
  readonly change: ValueChange | null;
  /** What changed of a column, gas or table, part by part; empty for a single value. */
  readonly parts: readonly PartChange[];
}

export interface PartChange {
  readonly part: string;
  readonly before: string;
  readonly after: string;
}

export interface FormulaChange extends BlockMention {
  readonly before: string;
  readonly after: string;
}

export interface ResultChange extends BlockMention {
  readonly change: ValueChange;
  /** Whether its own formula changed, or only what it reads. */
  readonly cause: 'formula' | 'affected';
}

export interface TextChange extends BlockMention {
  /** What of the block changed: `label`, `note`, `source`, `text`. */
  readonly what: string;
  readonly before: string;
  readonly after: string;
}
