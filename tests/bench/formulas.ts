import { all, create, type MathJsInstance } from 'mathjs';
import { single, type Column } from '../../core/axes/column.ts';
import type { Axis, AxisName } from '../../core/axes/axis.ts';
import { Arena } from '../../core/expression/arena.ts';
import { compile, type CompileContext } from '../../core/expression/compile.ts';
import { inferFormula } from '../../core/expression/infer-type.ts';
import { parseFormula } from '../../core/expression/parse-formula.ts';
import type { Program } from '../../core/expression/program.ts';
import { run } from '../../core/expression/run.ts';
import type { TypeScope } from '../../core/expression/type-scope.ts';
import { LIBRARY } from '../../core/library/catalogue.ts';
import { toSi } from '../../core/units/convert.ts';
import type { QuantityType } from '../../core/units/dimension.ts';
import { parseQuantity } from '../../core/units/parse-quantity.ts';
import { parseUnit } from '../../core/units/parse-unit.ts';
import { median } from './median.ts';
import type { Line } from './main.ts';

const FORMULAS = 200;
const CASES = 10_000;
/** mathjs is so much slower that a part of the cases tells its speed well enough. */
const MATHJS_CASES = 60;

/** One shape of formula: as a sheet writes it, as mathjs takes it, and as a loop written by hand computes it. */
interface Shape {
  readonly text: (k: number) => string;
  readonly loop: (k: number, given: Given, out: Float64Array) => void;
}

/** The varying values, in SI: pressure difference, speed of sound, length, diameter, mass, rate in cycles. */
interface Given {
  readonly dp: Float64Array;
  readonly c: Float64Array;
  readonly f: Float64Array;
  readonly D: number;
  readonly L: number;
  readonly m: number;
}

const SHAPES: readonly Shape[] = [
  {
    text: (k) => `dp*pi/4*D^2*${k}`,
    loop: (k, { dp, D }, out) => {
      for (let i = 0; i < out.length; i += 1) out[i] = ((dp[i]! * Math.PI) / 4) * (D * D) * k;
    },
  },
  {
    text: (k) => `c/(2*L)*${k} - f`,
    loop: (k, { c, f, L }, out) => {
      for (let i = 0; i < out.length; i += 1) out[i] = (c[i]! / (2 * L)) * k - f[i]!;
    },
  },
  {
    text: (k) => `sqrt((c/L)^2 + (${k}*f)^2)`,
    loop: (k, { c, f, L }, out) => {
      for (let i = 0; i < out.length; i += 1) {
        const a = c[i]! / L;
        const b = k * f[i]!;
        out[i] = Math.sqrt(a * a + b * b);
      }
    },
  },
  {
    text: (k) => `m*(${k}*c)^2/L + dp*D^2*${k}`,
    loop: (k, { c, dp, m, L, D }, out) => {
      for (let i = 0; i < out.length; i += 1) {
        const a = k * c[i]!;
        out[i] = (m * (a * a)) / L + dp[i]! * (D * D) * k;
      }
    },
  },
  {
    text: (k) => `dp*D^2*(1 + ${k}*f*L/c) / (1 + f*D/c)`,
    loop: (k, { dp, c, f, D, L }, out) => {
      for (let i = 0; i < out.length; i += 1) {
        out[i] = (dp[i]! * (D * D) * (1 + (k * f[i]! * L) / c[i]!)) / (1 + (f[i]! * D) / c[i]!);
      }
    },
  },
];

const NAMES: Readonly<Record<string, string>> = {
  dp: '22 psi',
  c: '420 m/s',
  f: '20 Hz',
  D: '5.761 in',
  L: '15 ft',
  m: '12 kg',
};

const TEXTS = Array.from({ length: FORMULAS }, (_, i) => SHAPES[i % SHAPES.length]?.text(1 + (i % 7)) ?? '');

/** 200 formulas over 10,000 cases, against mathjs with its units and against loops over numbers written by hand. */
export function benchFormulas(): Promise<Line[]> {
  const given = makeGiven();
  const { scope, context, columns } = makeScope(given);
  const preparing = times(15, () => prepare(scope, context));
  const programs = prepare(scope, context);
  const axes = scope.axes;
  const arena = new Arena();
  const ours = times(9, () => {
    arena.clear();
    for (const program of programs) run(program, columns, axes, arena);
  });
  const out = new Float64Array(CASES);
  const byHand = times(9, () => TEXTS.forEach((_, i) => SHAPES[i % SHAPES.length]?.loop(1 + (i % 7), given, out)));
  const perCase = (ms: number, cases: number): number => (ms * 1e6) / (FORMULAS * cases);
  const mathjs = perCase(withMathjs(given), MATHJS_CASES);
  const [block, hand] = [perCase(median(ours), CASES), perCase(median(byHand), CASES)];
  return Promise.resolve([
    {
      what: `${FORMULAS} formulas × ${CASES} cases, per formula and case`,
      measured: `${block.toFixed(2)} ns`,
      ratio: `${(mathjs / block).toFixed(0)} × faster than mathjs with units (${(mathjs / 1000).toFixed(1)} µs)`,
      goal: '≥ 500 ×',
    },
    {
      what: 'the same, against loops written by hand',
      measured: `${hand.toFixed(2)} ns`,
      ratio: `${(block / hand).toFixed(2)} × their time`,
      goal: '≤ 3 ×',
    },
    {
      what: `read, check and compile ${FORMULAS} formulas`,
      measured: `${median(preparing).toFixed(1)} ms`,
      ratio: '',
      goal: '≤ 20 ms',
    },
  ]);
}

function makeGiven(): Given {
  const vary = (from: number, to: number): Float64Array =>
    Float64Array.from({ length: CASES }, (_, i) => from + ((to - from) * i) / CASES);
  return { dp: vary(1e5, 2e5), c: vary(380, 460), f: vary(10, 20), D: 0.1463294, L: 4.572, m: 12 };
}

function makeScope(given: Given): {
  scope: TypeScope;
  context: CompileContext;
  columns: readonly Column[];
} {
  const types = new Map<string, QuantityType>();
  const columns: Column[] = [];
  const varying: Readonly<Record<string, Float64Array>> = { dp: given.dp, c: given.c, f: given.f };
  for (const [name, text] of Object.entries(NAMES)) {
    const quantity = parseQuantity(text, { file: '', start: 0, end: text.length }).value;
    if (quantity === undefined) throw new Error(text);
    types.set(name, { dimension: quantity.unit.dimension, kind: quantity.unit.kind });
    const data = varying[name];
    columns.push(data === undefined ? single(toSi(quantity.number, quantity.unit, {})) : { axes: ['speed'], data });
  }
  const unit = parseUnit('Hz');
  if (unit === null) throw new Error('no hertz');
  const speed: Axis = { name: 'speed', coordinates: given.f, type: unit, unit };
  const axes = new Map<AxisName, Axis>([['speed', speed]]);
  const shapes = new Map(Object.keys(varying).map((name) => [name, ['speed'] as const]));
  const scope: TypeScope = { types, shapes, axes, gases: new Set(), tables: new Map(), functions: LIBRARY, site: {} };
  const slots = new Map(Object.keys(NAMES).map((name, slot) => [name, slot]));
  return { scope, context: { slots, gases: new Map(), functions: LIBRARY, site: {} }, columns };
}

function prepare(scope: TypeScope, context: CompileContext): Program[] {
  return TEXTS.map((text) => {
    const formula = parseFormula(text, { file: '', start: 0, end: text.length }).value;
    const typed = formula && inferFormula(formula, scope).value;
    if (typed === undefined) throw new Error(text);
    return compile(typed.typed, context);
  });
}

/** Milliseconds for all formulas over some of the cases. */
function withMathjs(given: Given): number {
  const math: MathJsInstance = create(all ?? {});
  const unit = (value: number, name: string): unknown => math.unit(value, name);
  const compiled = TEXTS.map((text) => math.compile(text));
  const scopes = Array.from({ length: MATHJS_CASES }, (_, i) => ({
    dp: unit(given.dp[i] ?? 0, 'Pa'),
    c: unit(given.c[i] ?? 0, 'm/s'),
    f: unit(given.f[i] ?? 0, 'Hz'),
    D: unit(given.D, 'm'),
    L: unit(given.L, 'm'),
    m: unit(given.m, 'kg'),
  }));
  const runAll = (): void => {
    for (const scope of scopes) for (const formula of compiled) formula.evaluate(scope);
  };
  return median(times(3, runAll));
}

function times(runs: number, work: () => void): number[] {
  work();
  return Array.from({ length: runs }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  });
}
