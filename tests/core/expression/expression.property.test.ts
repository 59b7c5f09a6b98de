import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Diagnostic } from '../../../core/diagnostics/diagnostic.ts';
import { parseComparison, parseFormula } from '../../../core/expression/parse-formula.ts';
import type { ArithmeticOperator, Expression } from '../../../core/expression/tree.ts';
import { parseUnit } from '../../../core/units/parse-unit.ts';
import { printExpression } from './print-expression.ts';
import { comparisonFaults, evaluate, faultsOf, parsed, spanOf } from './support.ts';

const SPAN = spanOf('');
const PSI = parseUnit('psi');
const DENSITY = parseUnit('kg/m^3');
if (PSI === null || DENSITY === null) throw new Error('no unit');

const numberText = fc.oneof(fc.nat(9999).map(String), fc.constantFrom('0.5', '1.25', '3.0', '1e3', '2.5e-3'));

const { expression } = fc.letrec<{ expression: Expression }>((tie) => ({
  expression: fc.oneof(
    { maxDepth: 5 },
    numberText.map((text): Expression => ({ node: 'number', span: SPAN, value: Number(text), text })),
    fc.tuple(numberText, fc.constantFrom(PSI, DENSITY)).map(([text, unit]): Expression => ({
      node: 'quantity',
      span: SPAN,
      number: Number(text),
      text,
      unit,
      bracketed: true,
    })),
    fc
      .constantFrom('a', 'D_i', 'in', 'mod', 'to_1', 'psi', 'min')
      .map((name): Expression => ({ node: 'name', span: SPAN, name })),
    fc.constantFrom('Sch 80', 'run 3', '').map((value): Expression => ({ node: 'text', span: SPAN, value })),
    tie('expression').map((operand): Expression => ({ node: 'negate', span: SPAN, operand })),
    fc
      .tuple(fc.constantFrom<ArithmeticOperator>('+', '-', '*', '/', '^'), tie('expression'), tie('expression'))
      .map(([operator, left, right]): Expression => ({ node: 'binary', span: SPAN, operator, left, right })),
    fc
      .tuple(fc.constantFrom('f', 'sqrt', 'min', 'in'), fc.array(tie('expression'), { maxLength: 3 }))
      .map(([name, args]): Expression => ({
        node: 'call',
        span: SPAN,
        nameSpan: SPAN,
        function: name,
        arguments: args,
      })),
  ),
}));

/** A tree without its places. */
function bare(tree: Expression): unknown {
  return JSON.parse(
    JSON.stringify(tree, (key, value: unknown) => (key === 'span' || key === 'nameSpan' ? undefined : value)),
  );
}

function expectInside(diagnostics: readonly Diagnostic[], text: string): void {
  for (const { span, message } of diagnostics) {
    expect(span.start, message).toBeGreaterThanOrEqual(spanOf(text).start);
    expect(span.end, message).toBeLessThanOrEqual(spanOf(text).end);
    expect(span.end, message).toBeGreaterThanOrEqual(span.start);
    if (text !== '') expect(span.end, message).toBeGreaterThan(span.start);
  }
}

it('a tree that is printed and read again is the same tree', () => {
  fc.assert(
    fc.property(expression, (tree) => {
      const text = printExpression(tree);
      fc.pre(text.length <= 2000);
      expect(bare(parsed(text))).toEqual(bare(tree));
    }),
    { numRuns: 500 },
  );
});

const PIECES = [
  'a', 'D_i', 'p_d', 'zero', 'broken', 'pi', 'e', 'sqrt(', 'max(', 'f(', 'to', 'in', 'psi', 'psig', 'degC', '%', '5', '3/4', '3-1/2', '0.5', '1e9',
  '1e999', '+', '-', '*', '/', '^', '(', ')', ',', ' ', '  ', '<=', '<', '=', '²', "'", '"', "'Sch 80'", 'ft', '.', ':', '\n', '\\', '[', '√', '😀',
  '\u202E', '\uD800', '__proto__', 'constructor',
]; // prettier-ignore

describe('whatever is written', () => {
  const garbage = fc.oneof(
    fc.string({ unit: 'binary', maxLength: 60 }),
    fc.array(fc.constantFrom(...PIECES), { maxLength: 25 }).map((pieces) => pieces.join('')),
    fc.array(fc.constantFrom(...PIECES), { maxLength: 25 }).map((pieces) => pieces.join(' ')),
  );

  it('is read, typed and run without a throw, and each fault is inside the text', () => {
    fc.assert(
      fc.property(garbage, (text) => {
        const found = evaluate(text);
        expectInside(found.diagnostics, text);
        if (found.diagnostics.length === 0 && !/broken/.test(text)) expect(Number.isFinite(found.value)).toBe(true);
      }),
      { numRuns: 3000 },
    );
  });

  it('is read as a check without a throw', () => {
    fc.assert(
      fc.property(garbage, (text) => {
        expectInside(comparisonFaults(text), text);
        const { value, diagnostics } = parseComparison(text, spanOf(text));
        expect(value === undefined).toBe(diagnostics.length > 0);
      }),
      { numRuns: 1000 },
    );
  });

  it('gives either a tree or faults, and the same ones again', () => {
    fc.assert(
      fc.property(garbage, (text) => {
        const { value, diagnostics } = parseFormula(text, spanOf(text));
        expect(value === undefined).toBe(diagnostics.length > 0);
        expect(faultsOf(text)).toEqual(faultsOf(text));
      }),
      { numRuns: 500 },
    );
  });
});

describe('arithmetic', () => {
  const small = fc.integer({ min: -50, max: 50 });

  it('agrees with that of the language', () => {
    fc.assert(
      fc.property(small, small, small, (a, b, c) => {
        const text = `(${a}) - (${b})*(${c}) + (${a} - ${b < 0 ? `(${b})` : b})^2`;
        expect(evaluate(text).value).toBe(a - b * c + (a - b) ** 2);
      }),
    );
  });

  it('does not depend on the unit in which a length is written', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1000 }), (length) => {
        const [inches, feet] = [evaluate(`(${length * 12} in)^2`).value, evaluate(`(${length} ft)^2`).value];
        expect(Math.abs(inches / feet - 1)).toBeLessThan(1e-13);
      }),
    );
  });
});
