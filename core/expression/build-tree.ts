import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { checkSequence } from './check-sequence.ts';
import {
  FunctionNode,
  OperatorNode,
  ParenthesisNode,
  parsePlaceholders,
  SymbolNode,
  type ParsedNode,
} from './mathjs-parser.ts';
import { spanIn, type SourceText } from './source-text.ts';
import type { Token } from './token.ts';
import type { ArithmeticOperator, ComparisonOperator, Expression } from './tree.ts';

/** Makes the checked tree of a formula from its tokens. */
export function buildTree(source: SourceText, tokens: readonly Token[]): Diagnosed<Expression> {
  if (tokens.length === 0) return { diagnostics: [error('EXPRESSION_SYNTAX', source.span, 'the formula is empty')] };
  const faults = checkSequence(source, tokens);
  if (faults.length > 0) return { diagnostics: faults };
  const { text, starts } = placeholders(tokens);
  const parsed = parsePlaceholders(text);
  if ('stopsAt' in parsed) {
    const stop = starts.findIndex((start) => start >= parsed.stopsAt);
    return { diagnostics: [missingValue(source, tokens, stop === -1 ? tokens.length : stop)] };
  }
  return { value: new Builder(source, tokens).build(parsed).expression, diagnostics: [] };
}

/** Each operand becomes `t` and its index, each function `f` and its index; signs stay as they are. */
function placeholders(tokens: readonly Token[]): { readonly text: string; readonly starts: readonly number[] } {
  const starts: number[] = [];
  let text = '';
  for (const [i, token] of tokens.entries()) {
    starts.push(text.length);
    text += `${placeholder(token, i)} `;
  }
  return { text: text.trimEnd(), starts };
}

function placeholder(token: Token, index: number): string {
  switch (token.kind) {
    case 'number':
    case 'quantity':
    case 'name':
    case 'text':
      return `t${index}`;
    case 'function':
      return `f${index}`;
    case 'operator':
    case 'comparison':
    case 'open':
    case 'close':
    case 'comma':
      return token.text;
  }
}

/** All that can still be wrong once brackets and neighbours fit: a value is missing before the token at `at`. */
function missingValue(source: SourceText, tokens: readonly Token[], at: number): Diagnostic {
  const [before, token] = [tokens[at - 1], tokens[at]];
  const shown = ({ start, end }: Token): string => `\`${source.text.slice(start, end)}\``;
  const fault = (start: number, end: number, message: string): Diagnostic =>
    error('EXPRESSION_SYNTAX', spanIn(source, start, end), message);
  if (token === undefined || before === undefined) {
    const [at, message] = token
      ? [token, `a value is missing before ${shown(token)}`]
      : [before, 'a value is missing at the end'];
    return fault(at?.start ?? 0, at?.end ?? source.text.length, message);
  }
  if (before.kind === 'open' && token.kind === 'close') return fault(before.start, token.end, 'the brackets are empty');
  return fault(token.start, token.end, `a value is missing between ${shown(before)} and ${shown(token)}`);
}

/** A subtree and the tokens it covers, brackets around it included. */
interface Built {
  readonly expression: Expression;
  readonly first: number;
  readonly last: number;
}

class Builder {
  private readonly source: SourceText;
  private readonly tokens: readonly Token[];

  constructor(source: SourceText, tokens: readonly Token[]) {
    this.source = source;
    this.tokens = tokens;
  }

  build(node: ParsedNode): Built {
    if (node instanceof SymbolNode) return this.leaf(indexOf(node.name));
    if (node instanceof ParenthesisNode) return this.bracketed(this.build(node.content));
    if (node instanceof OperatorNode) return this.operation(node);
    if (node instanceof FunctionNode) return this.call(node);
    throw new Error('the parser gave a node that no token sequence allows');
  }

  private leaf(index: number): Built {
    const token = this.token(index);
    return { expression: leafOf(token, this.span(index, index)), first: index, last: index };
  }

  /** Brackets belong to the place of what they hold, unless that is a single word with a place of its own. */
  private bracketed({ expression, first, last }: Built): Built {
    return { expression: this.inBrackets(expression, first - 1, last + 1), first: first - 1, last: last + 1 };
  }

  private inBrackets(expression: Expression, first: number, last: number): Expression {
    if (expression.node === 'quantity') return { ...expression, bracketed: true };
    const grows = expression.node === 'binary' || expression.node === 'negate';
    return grows ? { ...expression, span: this.span(first, last) } : expression;
  }

  private operation({ operator, operands, implicit }: OperatorNode): Built {
    const [left, right] = operands;
    if (left === undefined || implicit) throw new Error(`the parser gave the operator ${operator}`);
    if (right !== undefined && isComparison(operator))
      return this.comparison(operator, this.build(left), this.build(right));
    if (!isArithmetic(operator)) throw new Error(`the parser gave the operator ${operator}`);
    if (right === undefined) return this.signed(operator, this.build(left));
    const [a, b] = [this.build(left), this.build(right)];
    const span = this.span(a.first, b.last);
    const expression: Expression = { node: 'binary', span, operator, left: a.expression, right: b.expression };
    return { expression, first: a.first, last: b.last };
  }

  private comparison(operator: ComparisonOperator, a: Built, b: Built): Built {
    const span = this.span(a.first, b.last);
    const expression: Expression = { node: 'comparison', span, operator, left: a.expression, right: b.expression };
    return { expression, first: a.first, last: b.last };
  }

  private signed(operator: ArithmeticOperator, { expression, first, last }: Built): Built {
    const span = this.span(first - 1, last);
    if (operator === '+') return { expression, first: first - 1, last };
    const isReading = expression.node === 'quantity' && expression.unit.kind === 'level' && first === last;
    // -10 degC is one reading, not the opposite of 10 degC.
    if (isReading && expression.number >= 0) {
      const reading: Expression = { ...expression, span, number: -expression.number, text: `-${expression.text}` };
      return { expression: reading, first: first - 1, last };
    }
    return { expression: { node: 'negate', span, operand: expression }, first: first - 1, last };
  }

  private call({ head, args }: FunctionNode): Built {
    if (!(head instanceof SymbolNode)) throw new Error('the parser gave a call without a name');
    const first = indexOf(head.name);
    const built = args.map((arg) => this.build(arg));
    const last = (built.at(-1)?.last ?? first + 1) + 1;
    const expression: Expression = {
      node: 'call',
      span: this.span(first, last),
      nameSpan: this.span(first, first),
      function: this.token(first).text,
      arguments: built.map((argument) => argument.expression),
    };
    return { expression, first, last };
  }

  private span(first: number, last: number): Expression['span'] {
    return spanIn(this.source, this.token(first).start, this.token(last).end);
  }

  private token(index: number): Token {
    const token = this.tokens[index];
    if (token === undefined) throw new Error(`no token ${index}`);
    return token;
  }
}

function leafOf(token: Token, span: Expression['span']): Expression {
  switch (token.kind) {
    case 'number':
      return { node: 'number', span, value: token.value, text: token.text };
    case 'quantity':
      return { node: 'quantity', span, number: token.number, text: token.text, unit: token.unit };
    case 'name':
      return { node: 'name', span, name: token.text };
    case 'text':
      return { node: 'text', span, value: token.text };
    case 'function':
    case 'operator':
    case 'comparison':
    case 'open':
    case 'close':
    case 'comma':
      throw new Error(`a ${token.kind} stands for a value`);
  }
}

function indexOf(placeholderName: string): number {
  return Number(placeholderName.slice(1));
}

function isComparison(operator: string): operator is ComparisonOperator {
  return operator === '<' || operator === '<=' || operator === '>' || operator === '>=';
}

function isArithmetic(operator: string): operator is ArithmeticOperator {
  return operator === '+' || operator === '-' || operator === '*' || operator === '/' || operator === '^';
}
