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
}

export interface StepNode extends Annotations {
  readonly name: Text;
  readonly calc: Text;
  readonly unit?: Text;
}

export interface CheckNode extends Annotations {
  readonly that: Text;
}

export interface SectionNode {
  readonly title: Text;
  readonly text?: Text;
  readonly steps: readonly StepNode[];
  readonly checks: readonly CheckNode[];
}

export interface GasNode {
  readonly name: Text;
  readonly method?: Text;
  readonly fractions: readonly { readonly component: Text; readonly amount: Text }[];
  readonly source?: Text;
  readonly note?: Text;
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
  readonly sources: readonly { readonly id: Text; readonly text: Text }[];
  readonly assumptions: readonly Text[];
  readonly gases: readonly GasNode[];
  readonly inputs: readonly InputNode[];
  readonly sections: readonly SectionNode[];
  /** Names of inputs and steps that could not be read; their faults are reported already. */
  readonly unread: readonly Text[];
}
