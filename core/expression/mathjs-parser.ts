import { createParse } from 'mathjs';

/**
 * The grammar of mathjs, and nothing else of it. Its parser is made from the node classes below instead of its own, so
 * that none of its functions, units or evaluators are loaded, and so that everything a formula may not use arrives here
 * as a `RefusedNode`. The parser sees placeholders only (`t12 + f13(t14)`): no word of a sheet ever reaches it.
 */
declare module 'mathjs' {
  export function createParse(parts: ParserParts): (text: string) => ParsedNode;
}

type NodeClass = new (...args: never[]) => ParsedNode;
type Overloads = Readonly<Record<string, (text: string) => ParsedNode>>;

interface ParserParts {
  readonly typed: ((name: string, overloads: Overloads) => unknown) & { readonly addConversion: () => void };
  readonly numeric: () => number;
  readonly config: Readonly<Record<string, never>>;
  readonly [nodeClass: `${string}Node`]: NodeClass;
}

/** mathjs asks a node's prototype whether it is a node at all. */
class Node {
  get isNode(): true {
    return true;
  }
}

export class SymbolNode extends Node {
  readonly name: string;
  readonly isSymbolNode = true;

  constructor(name: string) {
    super();
    this.name = name;
  }
}

export class ParenthesisNode extends Node {
  readonly content: ParsedNode;

  constructor(content: ParsedNode) {
    super();
    this.content = content;
  }
}

export class OperatorNode extends Node {
  readonly operator: string;
  readonly operands: readonly ParsedNode[];
  readonly implicit: boolean;

  constructor(operator: string, _functionName: string, operands: readonly ParsedNode[], implicit = false) {
    super();
    this.operator = operator;
    this.operands = operands;
    this.implicit = implicit;
  }
}

export class FunctionNode extends Node {
  readonly head: ParsedNode;
  readonly args: readonly ParsedNode[];

  constructor(head: ParsedNode, args: readonly ParsedNode[]) {
    super();
    this.head = head;
    this.args = args;
  }
}

/** Stands for every kind of node that formulas may not use. */
export class RefusedNode extends Node {
  readonly refused = true;
}

export type ParsedNode = SymbolNode | ParenthesisNode | OperatorNode | FunctionNode | RefusedNode;

/** mathjs offers its parser for several types of argument; text is the only one that is wanted here. */
const textOnly = Object.assign((_name: string, overloads: Overloads) => overloads['string'], {
  addConversion: (): void => undefined,
});

const parse = createParse({
  typed: textOnly,
  numeric: () => Number.NaN,
  config: {},
  SymbolNode,
  ParenthesisNode,
  OperatorNode,
  FunctionNode,
  AccessorNode: RefusedNode,
  ArrayNode: RefusedNode,
  AssignmentNode: RefusedNode,
  BlockNode: RefusedNode,
  ConditionalNode: RefusedNode,
  ConstantNode: RefusedNode,
  FunctionAssignmentNode: RefusedNode,
  IndexNode: RefusedNode,
  ObjectNode: RefusedNode,
  RangeNode: RefusedNode,
  RelationalNode: RefusedNode,
});

/** The tree of a text of placeholders, or the offset at which it stops making sense. */
export function parsePlaceholders(text: string): ParsedNode | { readonly stopsAt: number } {
  try {
    return parse(text);
  } catch (fault) {
    if (fault instanceof SyntaxError && 'char' in fault && typeof fault.char === 'number')
      return { stopsAt: fault.char - 1 };
    throw fault;
  }
}
