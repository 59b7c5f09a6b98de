import { pipeBore, pipeOutsideDiameter, pipeWall, type PipeLookup } from '../mechanics/pipe-sizes.ts';
import { LENGTH } from '../units/dimensions.ts';
import { sizeAt, textAt } from './arguments.ts';
import type { FunctionResult, LibraryFunction, Parameter } from './function.ts';

const NPS: Parameter = {
  name: 'nps',
  symbol: '\\mathrm{NPS}',
  summary: "nominal pipe size: 6, 0.75, '3/4', '1-1/2'",
  kind: { takes: 'size' },
};

const SCHEDULE: Parameter = {
  name: 'schedule',
  symbol: '\\mathrm{Sch}',
  summary: 'schedule',
  kind: { takes: 'text', examples: ['Sch 80', 'STD', 'XS', '10S'] },
};

const SHARED = {
  topic: 'pipe',
  validity: 'Wrought steel and stainless steel pipe, NPS 1/8 to 48, nominal wall; mill tolerances are not taken off.',
  source: 'ASME B36.10M and ASME B36.19M, tables of dimensions',
} as const;

function lengthInInches(summary: string): LibraryFunction['returns'] {
  return { dimension: LENGTH, kind: 'plain', unit: 'in', summary };
}

/** Puts what a look-up has to say under the argument that it is about. */
function fromLookup(lookup: PipeLookup): FunctionResult {
  if (!('missing' in lookup)) return { value: lookup.value, notices: [] };
  const { about, message, hints } = lookup.missing;
  const argument = about === 'size' ? 0 : 1;
  return { value: Number.NaN, notices: [{ code: 'LOOKUP_MISSING', severity: 'error', message, hints, argument }] };
}

export const PIPE_FUNCTIONS: readonly LibraryFunction[] = [
  {
    ...SHARED,
    name: 'pipe_bore',
    summary: 'Bore of steel pipe',
    symbol: 'pipe bore',
    formula: 'D_\\mathrm{i} = D_\\mathrm{o} - 2\\,t',
    parameters: [NPS, SCHEDULE],
    returns: lengthInInches('inside diameter'),
    example: { call: "pipe_bore(6, 'Sch 80')", result: '5.761 in' },
    evaluate: (args) => fromLookup(pipeBore(sizeAt(args, 0), textAt(args, 1))),
  },
  {
    ...SHARED,
    name: 'pipe_outside_diameter',
    summary: 'Outside diameter of steel pipe',
    symbol: 'pipe outside diameter',
    formula: 'D_\\mathrm{o}\\left(\\mathrm{NPS}\\right)\\ \\text{from the table}',
    parameters: [NPS],
    returns: lengthInInches('outside diameter'),
    example: { call: 'pipe_outside_diameter(6)', result: '6.625 in' },
    evaluate: (args) => fromLookup(pipeOutsideDiameter(sizeAt(args, 0))),
  },
  {
    ...SHARED,
    name: 'pipe_wall',
    summary: 'Nominal wall thickness of steel pipe',
    symbol: 'pipe wall',
    formula: 't\\left(\\mathrm{NPS},\\ \\mathrm{Sch}\\right)\\ \\text{from the table}',
    parameters: [NPS, SCHEDULE],
    returns: lengthInInches('wall thickness'),
    example: { call: "pipe_wall(6, 'Sch 80')", result: '0.4320 in' },
    evaluate: (args) => fromLookup(pipeWall(sizeAt(args, 0), textAt(args, 1))),
  },
];
