import type { Span } from '../diagnostics/diagnostic.ts';

/** A piece of text as the sheet wrote it, with its place. `span` covers the text without its quotes where it is plain. */
export interface Text {
  readonly text: string;
  readonly span: Span;
}

/** What every block may carry besides its own subject. */
export interface Annotations {
  readonly label?: Text;
  /** TeX symbol given by the engineer; derived from the name when absent. */
  readonly symbol?: Text;
  /** Significant digits for the result. */
  readonly digits?: number;
  readonly note?: Text;
  /** Id of an entry of `sources`. */
  readonly source?: Text;
}

export interface InputNode extends Annotations {
  readonly name: Text;
  readonly value: Text;
  readonly hold?: Text;
  /** How far the value may be off: a share or a difference, to both sides. */
  readonly tolerance?: Text;
  /** Least and greatest value that it may have. */
  readonly range?: readonly [Text, Text];
  /** Range in which an experienced engineer would believe it. */
  readonly expect?: Text;
}

/** One quantity, gas or text for every operating condition. */
export interface ConditionColumnNode extends Annotations {
  readonly name: Text;
  /** Unit of the cells that are bare numbers, or `gas`, or `text`. */
  readonly unit?: Text;
  readonly hold?: Text;
  readonly cells: readonly Text[];
}

export interface ConditionsNode {
  readonly ids: readonly Text[];
  readonly columns: readonly ConditionColumnNode[];
}

/** A table of two columns that formulas read by `interpolate`. */
export interface LookupNode extends Annotations {
  readonly name: Text;
  readonly columns: readonly { readonly name: Text; readonly unit: Text }[];
  readonly rows: readonly (readonly Text[])[];
}

/** A value of another sheet's revision: `TH3-C-102@0#T_d`. */
export interface TakeNode extends Annotations {
  readonly name: Text;
  readonly from: Text;
}

export interface StepNode extends Annotations {
  readonly name: Text;
  readonly calc: Text;
  readonly unit?: Text;
  readonly expect?: Text;
}

export interface TableNode {
  readonly title?: Text;
  readonly of: readonly Text[];
  readonly note?: Text;
}

export interface FigureNode {
  readonly kind: Text;
  readonly of: Text;
  readonly limit?: Text;
  readonly unit?: Text;
  readonly title?: Text;
  readonly note?: Text;
}

export interface CheckNode extends Annotations {
  readonly that: Text;
}

export interface SectionNode {
  readonly title: Text;
  readonly text?: Text;
  readonly steps: readonly StepNode[];
  readonly checks: readonly CheckNode[];
  readonly tables: readonly TableNode[];
  readonly figures: readonly FigureNode[];
}

export interface GasNode {
  readonly name: Text;
  readonly method?: Text;
  readonly fractions: readonly { readonly component: Text; readonly amount: Text }[];
  readonly source?: Text;
  readonly note?: Text;
  /** How far the share of a component may be off. */
  readonly tolerance: readonly { readonly component: Text; readonly amount: Text }[];
}

/**
 * A sheet in its one explicit form: shorthand expanded, every scalar with its place, nothing evaluated yet.
 * `p_d: 905 psig` has become an InputNode, `A: pi/4 * D^2` a StepNode.
 */
export interface SheetDocument {
  readonly file: string;
  readonly number: Text;
  readonly title: Text;
  readonly units: 'us' | 'si';
  readonly atmosphere?: Text;
  /** Reference states of normal and standard volumes: `1.01325 bara, 0 degC`. */
  readonly normal?: Text;
  readonly standard?: Text;
  /** Files whose definitions the sheet uses. */
  readonly use: readonly Text[];
  readonly take: readonly TakeNode[];
  readonly sources: readonly { readonly id: Text; readonly text: Text }[];
  readonly assumptions: readonly Text[];
  readonly exclusions: readonly Text[];
  readonly references: readonly Text[];
  readonly conditions?: ConditionsNode;
  readonly lookups: readonly LookupNode[];
  readonly gases: readonly GasNode[];
  readonly inputs: readonly InputNode[];
  readonly sections: readonly SectionNode[];
  /** Names of inputs and steps that could not be read; their faults are reported already. */
  readonly unread: readonly Text[];
}
