import type { Annotations, SheetDocument, Text } from '../sheet/document.ts';
import type { Shape } from '../axes/shape.ts';
import type { Printed } from '../units/printed.ts';
import type { EvaluatedSheet } from './evaluated-sheet.ts';
import type { Block } from './model.ts';

type Undigested<B> = B extends Block ? Omit<B, 'digest'> : never;

/** A block before its digest is known: with what it says, and the paths of the blocks that it rests on. */
export interface Draft {
  readonly block: Undigested<Block>;
  readonly content: unknown;
  readonly uses: readonly string[];
}

/** One case of a formula over axes: the one whose numbers are put in. */
export interface Case {
  readonly axes: Shape;
  readonly cell: number;
}

/** What the drafts of all blocks are made from. */
export interface DraftContext {
  readonly sheet: EvaluatedSheet;
  /** Line (from 1) of a place. */
  readonly lineOf: (at: Text['span']) => number;
  /** Path of the block that defines a name. */
  readonly pathOf: (name: string) => string | undefined;
  readonly symbolOf: (name: string) => string;
  /** The value of a name as formulas compute with it, in one case where it has several. */
  readonly printedOf: (name: string, one: Case) => Printed | undefined;
}

export const ATMOSPHERE_PATH = 'atmosphere';

export function place(at: Text, context: DraftContext): { file: string; line: number } {
  return { file: at.span.file, line: context.lineOf(at.span) };
}

/** Label, note and source of a block; the name stands in for a label that is not given. */
export function annotations(
  node: Annotations,
  name: string,
  context: DraftContext,
): { label: string; note?: string; source?: string } {
  const source = node.source === undefined ? undefined : sourceText(node.source.text, context);
  return {
    label: node.label?.text ?? name,
    ...(node.note === undefined ? {} : { note: node.note.text }),
    ...(source === undefined ? {} : { source }),
  };
}

export function sourceText(
  id: string,
  { sheet }: { readonly sheet: { readonly document: SheetDocument } },
): string | undefined {
  return sheet.document.sources.find((source) => source.id.text === id)?.text.text;
}

/** What of an annotation counts as the block's own text. Null where it is not given, as canonical JSON knows no undefined. */
export function annotationContent(node: Annotations, context: DraftContext): unknown {
  return {
    label: node.label?.text ?? null,
    symbol: node.symbol?.text ?? null,
    digits: node.digits ?? null,
    note: node.note?.text ?? null,
    source: node.source === undefined ? null : (sourceText(node.source.text, context) ?? null),
  };
}

/** Formula text as it counts for a digest: runs of white space are one space. */
export function plainText(text: string): string {
  return text.trim().replace(/\s+/g, ' ');
}
