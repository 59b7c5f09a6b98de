import { nearest } from '../../core/diagnostics/nearest.ts';
import { CONSTANTS } from '../../core/expression/constants.ts';
import { AXIS_FUNCTIONS, type AxisFunction } from '../../core/expression/axis-functions.ts';
import { BUILT_IN_NAMES } from '../../core/expression/built-in.ts';
import { MATHEMATICS, type MathFunction } from '../../core/expression/mathematics.ts';
import { LIBRARY } from '../../core/library/catalogue.ts';
import type { LibraryFunction, Parameter } from '../../core/library/function.ts';
import { CommandFailure, EXIT, type ExitStatus } from '../exit-status.ts';
import type { Invocation } from '../program.ts';

/** The catalogue, or one function in full. */
export function functions(
  name: string | undefined,
  { format }: { readonly format: 'text' | 'json' },
  at: Invocation,
): Promise<ExitStatus> {
  const text = name === undefined ? catalogue(format) : one(name, format, at);
  at.streams.out(text);
  return Promise.resolve(EXIT.done);
}

function catalogue(format: 'text' | 'json'): string {
  if (format === 'json') return json([...LIBRARY.values()].map(asData));
  const topics = [...new Set([...LIBRARY.values()].map(({ topic }) => topic))];
  const width = Math.max(...[...LIBRARY.values()].map((fn) => head(fn).length));
  const listed = topics.map((topic) =>
    [
      topic,
      ...[...LIBRARY.values()]
        .filter((fn) => fn.topic === topic)
        .map((fn) => `  ${head(fn).padEnd(width)}  ${fn.summary}`),
    ].join('\n'),
  );
  const axes = [...AXIS_FUNCTIONS.values()].map((fn) => `  ${builtInHead(fn).padEnd(width)}  ${fn.summary}`);
  const mathematics = `mathematics\n  ${[...MATHEMATICS.keys()].join(' ')}\n  constants: ${[...CONSTANTS.keys()].join(' ')}`;
  const parts = [...listed, ['axes', ...axes].join('\n'), mathematics];
  return `${parts.join('\n\n')}\n\n\`antinode functions NAME\` tells all about one, \`antinode functions TOPIC\` lists one topic.\n`;
}

function one(name: string, format: 'text' | 'json', at: Invocation): string {
  const fn = LIBRARY.get(name);
  if (fn !== undefined) return format === 'json' ? json([asData(fn)]) : described(fn, at);
  const builtIn = MATHEMATICS.get(name) ?? AXIS_FUNCTIONS.get(name);
  if (builtIn !== undefined) return format === 'json' ? json([builtInData(builtIn)]) : describedBuiltIn(builtIn, at);
  if (name === 'axes') return format === 'json' ? json([...AXIS_FUNCTIONS.values()].map(builtInData)) : axesText(at);
  const topic = [...LIBRARY.values()].filter((each) => each.topic === name);
  if (topic.length > 0)
    return format === 'json' ? json(topic.map(asData)) : `${topic.map((each) => described(each, at)).join('\n')}`;
  const near = nearest(name, [...LIBRARY.keys(), ...BUILT_IN_NAMES], 3);
  throw new CommandFailure(EXIT.usage, `there is no function \`${name}\``, [
    near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : '`antinode functions` lists all',
  ]);
}

function described(fn: LibraryFunction, { paintOut }: Invocation): string {
  const width = Math.max(...fn.parameters.map(({ name }) => name.length));
  return `${[
    paintOut('bold', head(fn)),
    `  ${fn.summary}`,
    '',
    `  formula   ${fn.formula}`,
    ...fn.parameters.map(
      (parameter, i) =>
        `  ${i === 0 ? 'takes   ' : '        '}  ${parameter.name.padEnd(width)}  ${parameterText(parameter)}`,
    ),
    `  gives     ${fn.returns.summary}${fn.returns.unit === '1' ? '' : `, in ${fn.returns.unit}`}`,
    `  valid     ${fn.validity}`,
    `  source    ${fn.source}`,
    `  example   ${fn.example.call} = ${fn.example.result}`,
  ].join('\n')}\n`;
}

function axesText(at: Invocation): string {
  return [...AXIS_FUNCTIONS.values()].map((fn) => describedBuiltIn(fn, at)).join('\n');
}

type BuiltIn = MathFunction | AxisFunction;

function builtInHead({ name, parameters }: BuiltIn): string {
  return `${name}(${parameters.map((parameter) => parameter.name).join(', ')})`;
}

function describedBuiltIn(fn: BuiltIn, { paintOut }: Invocation): string {
  const width = Math.max(...fn.parameters.map(({ name }) => name.length));
  return `${[
    paintOut('bold', builtInHead(fn)),
    `  ${fn.summary}`,
    '',
    ...fn.parameters.map(
      ({ name, summary }, i) => `  ${i === 0 ? 'takes   ' : '        '}  ${name.padEnd(width)}  ${summary}`,
    ),
    `  gives     ${fn.returns}`,
    `  valid     ${fn.validity}`,
    `  example   ${fn.example.call} = ${fn.example.result}`,
  ].join('\n')}\n`;
}

function builtInData({ name, topic, summary, parameters, returns, validity, example }: BuiltIn): unknown {
  return { name, topic, summary, parameters, returns, validity, example };
}

function head(fn: LibraryFunction): string {
  return `${fn.name}(${fn.parameters.map(({ name }) => name).join(', ')})`;
}

function parameterText({ summary, kind, range }: Parameter): string {
  return [summary, unitText(kind), rangeText(range)].filter((part) => part !== '').join('; ');
}

function unitText(kind: Parameter['kind']): string {
  switch (kind.takes) {
    case 'quantity':
      return kind.kind === 'level'
        ? `a level, in ${kind.unit} or any unit of its kind`
        : `in ${kind.unit} or any unit of its kind`;
    case 'number':
      return kind.integer === true ? 'a whole number' : 'a number';
    case 'text':
      return `such as ${kind.examples.map((example) => `'${example}'`).join(', ')}`;
    case 'size':
    case 'gas':
      return '';
  }
}

function rangeText(range: Parameter['range']): string {
  if (range === undefined) return '';
  const { above, from, below, to } = range;
  const parts = [
    above === undefined ? '' : `above ${above}`,
    from === undefined ? '' : `from ${from}`,
    below === undefined ? '' : `below ${below}`,
    to === undefined ? '' : `to ${to}`,
  ];
  return parts.filter((part) => part !== '').join(' ');
}

function asData({ evaluate: _, ...data }: LibraryFunction): unknown {
  return data;
}

function json(functions: readonly unknown[]): string {
  return `${JSON.stringify({ antinode: 'functions/1', functions }, null, 2)}\n`;
}
