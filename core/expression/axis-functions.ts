/** How the values along an axis become one. */
export type Reduction = 'max' | 'min' | 'mean' | 'sum' | 'envelope';

/** What a call that speaks of axes does. */
export type AxisRole =
  | { readonly does: 'reduce'; readonly how: Reduction }
  | { readonly does: 'count'; readonly axis: 'harmonic' | 'angle' }
  | { readonly does: 'pick' | 'choose' | 'interpolate' };

/** A function that works along axes rather than on single values. */
export interface AxisFunction {
  readonly name: string;
  readonly topic: 'axes';
  readonly summary: string;
  readonly parameters: readonly { readonly name: string; readonly summary: string }[];
  readonly returns: string;
  readonly validity: string;
  readonly example: { readonly call: string; readonly result: string };
  readonly role: AxisRole;
  /** TeX of a call, from the TeX of its arguments. */
  readonly tex: (args: readonly string[]) => string;
}

const X = { name: 'x', summary: 'any quantity that varies along the axis' };
const AXIS = { name: 'axis', summary: "name of the axis: 'condition', 'speed', 'harmonic', 'angle' or 'place'" };
const ALONG = 'The argument varies along the axis; its other axes stay.';

const LIST: readonly AxisFunction[] = [
  over('max_over', 'max', 'Largest value along an axis', '\\max'),
  over('min_over', 'min', 'Smallest value along an axis', '\\min'),
  over('mean_over', 'mean', 'Arithmetic mean along an axis', '\\operatorname{mean}'),
  over('sum_over', 'sum', 'Sum along an axis', '\\sum'),
  {
    name: 'envelope',
    topic: 'axes',
    summary: 'Largest magnitude over all conditions and speeds',
    parameters: [{ name: 'x', summary: 'any quantity that varies along `condition` or `speed`' }],
    returns: 'the same quantity over its remaining axes, without its sign',
    validity: 'The argument varies along `condition`, `speed` or both.',
    example: { call: 'envelope(F)', result: 'F over harmonic' },
    role: { does: 'reduce', how: 'envelope' },
    tex: ([x = '']) => `\\operatorname{env}\\left(${x}\\right)`,
  },
  {
    name: 'at',
    topic: 'axes',
    summary: 'Value at one point of an axis',
    parameters: [X, AXIS, { name: 'point', summary: "an operating condition such as 'C07', or a value of the axis" }],
    returns: 'the same quantity over its remaining axes',
    validity: 'The point is one of the axis; there is no interpolation.',
    example: { call: "at(F, 'condition', 'C07')", result: 'F at C07' },
    role: { does: 'pick' },
    tex: ([x = '', , point = '']) => `\\left.${x}\\right|_{${point}}`,
  },
  {
    name: 'where',
    topic: 'axes',
    summary: 'One of two values, whichever a comparison asks for',
    parameters: [
      { name: 'comparison', summary: 'two quantities with `<`, `<=`, `>` or `>=` between them' },
      { name: 'a', summary: 'the value where the comparison holds' },
      { name: 'b', summary: 'the value elsewhere, of the same dimension' },
    ],
    returns: 'a quantity of that dimension over the axes of all arguments',
    validity: 'Both values are computed everywhere, and must exist everywhere.',
    example: { call: 'where(N <= N_max, F, 0 lbf)', result: 'F up to N_max, nothing above' },
    role: { does: 'choose' },
    tex: ([comparison = '', a = '', b = '']) =>
      `\\begin{cases}${a}&\\text{where }${comparison}\\\\${b}&\\text{elsewhere}\\end{cases}`,
  },
  {
    name: 'interpolate',
    topic: 'axes',
    summary: 'Value of a table of the sheet, on the straight line between its points',
    parameters: [
      { name: 'table', summary: 'name of a table of the sheet' },
      { name: 'x', summary: 'a quantity like that of its first column' },
    ],
    returns: 'a quantity like that of its second column',
    validity: 'From the first to the last point of the table; never beyond.',
    example: { call: 'interpolate(loss, 0.45)', result: 'loss at 0.45' },
    role: { does: 'interpolate' },
    tex: ([table = '', x = '']) => `${table}\\left(${x}\\right)`,
  },
  {
    name: 'harmonics',
    topic: 'axes',
    summary: 'The orders 1 to n, as an axis',
    parameters: [{ name: 'n', summary: 'how many, a whole number written out' }],
    returns: 'whole numbers along the axis `harmonic`',
    validity: 'From 1 to 500; all of one sheet are equally many.',
    example: { call: 'harmonics(40)', result: '1, 2, 3, … 40' },
    role: { does: 'count', axis: 'harmonic' },
    tex: ([n = '']) => `(1\\ldots ${n})`,
  },
  {
    name: 'angles',
    topic: 'axes',
    summary: 'Crank angles over one turn, in n equal steps from zero, as an axis',
    parameters: [{ name: 'n', summary: 'how many, a whole number written out' }],
    returns: 'angles along the axis `angle`',
    validity: 'From 4 to 3600; all of one sheet are equally many.',
    example: { call: 'angles(72)', result: '0, 5, 10, … 355 deg' },
    role: { does: 'count', axis: 'angle' },
    tex: ([n = '']) => `(0\\ldots 2\\pi)_{${n}}`,
  },
];

/** The functions that work along axes, by name. */
export const AXIS_FUNCTIONS: ReadonlyMap<string, AxisFunction> = new Map(LIST.map((fn) => [fn.name, fn]));

function over(name: string, how: Reduction, summary: string, head: string): AxisFunction {
  return {
    name,
    topic: 'axes',
    summary,
    parameters: [X, AXIS],
    returns: 'the same quantity over its remaining axes',
    validity: ALONG,
    example: { call: `${name}(F, 'speed')`, result: `F over its remaining axes` },
    role: { does: 'reduce', how },
    tex: ([x = '', axis = '']) => `${head}_{${axis}}\\left(${x}\\right)`,
  };
}
