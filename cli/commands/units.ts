import { locateDiagnostic } from '../../core/diagnostics/locate.ts';
import { fromSi, toSi } from '../../core/units/convert.ts';
import { describeDimension, describeType, sameDimension } from '../../core/units/dimensions.ts';
import { parseQuantity, type ParsedQuantity } from '../../core/units/parse-quantity.ts';
import { parseUnit } from '../../core/units/parse-unit.ts';
import { printNumber } from '../../core/units/print.ts';
import { ALL_UNITS } from '../../core/units/table.ts';
import type { Site } from '../../core/units/site.ts';
import type { Unit } from '../../core/units/unit.ts';
import { EXIT, type ExitStatus } from '../exit-status.ts';
import { diagnosticsText } from '../output/print-diagnostics.ts';
import type { Invocation } from '../program.ts';

/** Without a sheet, gauge readings are read against the standard atmosphere, and the answer says so. */
const SITE: Site = {
  atmosphere: 101_325,
  normal: { pressure: 101_325, temperature: 273.15 },
  standard: { pressure: 101_325, temperature: 288.15 },
};

const STATES = { normal: '101.325 kPa and 0 °C', standard: '101.325 kPa and 15 °C' } as const;

/** The table of units, or what one value is in the other units of its kind. */
export function units(
  text: string,
  { format }: { readonly format: 'text' | 'json' },
  at: Invocation,
): Promise<ExitStatus> {
  if (text.trim() === '') {
    at.streams.out(format === 'json' ? json({ antinode: 'units/1', units: ALL_UNITS.map(asData) }) : table(at));
    return Promise.resolve(EXIT.done);
  }
  const written = parseUnit(text) === null ? text : `1 ${text}`;
  const { value, diagnostics } = parseQuantity(written, { file: 'argument', start: 0, end: written.length });
  if (value === undefined) {
    const located = diagnostics.map((diagnostic) => locateDiagnostic(diagnostic, () => written));
    if (format === 'json') at.streams.out(json({ antinode: 'diagnostics/1', diagnostics: located }));
    else at.streams.err(diagnosticsText(located, at.paintErr));
    return Promise.resolve(EXIT.sheetWrong);
  }
  const shown = conversions(value);
  at.streams.out(format === 'json' ? json(conversionData(value, shown)) : conversionText(value, shown, at));
  return Promise.resolve(EXIT.done);
}

function table({ paintOut }: Invocation): string {
  const names = new Set(ALL_UNITS.map(({ dimension }) => describeDimension(dimension)));
  const rows = [...names].map((name) => {
    const of = ALL_UNITS.filter(({ dimension }) => describeDimension(dimension) === name);
    return `${paintOut('bold', name)}\n${kinds(of)}`;
  });
  return `${rows.join('\n')}\n\nProducts and powers of them are units too: kg/m^3, in^2, J/(kg*K), ft*lbf.\n`;
}

function kinds(units: readonly Unit[]): string {
  const lines = [...new Set(units.map(({ kind }) => kind))].map((kind) => {
    const names = units.filter((unit) => unit.kind === kind).map(({ text }) => text);
    return `  ${kind === 'plain' ? '' : `${KIND_WORDS[kind]}: `}${names.join(' ')}`;
  });
  return lines.join('\n');
}

const KIND_WORDS: Readonly<Record<Unit['kind'], string>> = {
  plain: '',
  level: 'levels',
  difference: 'differences',
  open: 'level where a level is wanted, else difference',
  percent: 'shares',
  cycles: 'cycles',
  radians: 'radians',
  root: '',
};

interface Conversion {
  readonly unit: string;
  readonly value: number;
}

function conversions({ number, unit }: ParsedQuantity): Conversion[] {
  const si = toSi(number, unit, SITE);
  return ALL_UNITS.filter((other) => sameDimension(other.dimension, unit.dimension) && reads(other, unit)).map(
    (other) => ({
      unit: other.text,
      value: fromSi(si, other, SITE),
    }),
  );
}

/** Whether a value in one unit can be said in the other; K and degR are read as levels here. */
function reads(a: Unit, b: Unit): boolean {
  const kindOf = ({ kind }: Unit): Unit['kind'] => (kind === 'open' ? 'level' : kind);
  return kindOf(a) === kindOf(b);
}

function conversionText(
  { number, unit }: ParsedQuantity,
  shown: readonly Conversion[],
  { paintOut }: Invocation,
): string {
  const head = `${paintOut('bold', `${printNumber(number, 10).replace(/\.?0+$/, '')} ${unit.text}`)}: ${describeType(unit)}`;
  const gauge = shown.some(({ unit: text }) => parseUnit(text)?.gauge === true)
    ? ['  gauge readings at the standard atmosphere, 101.325 kPa; a sheet states its own']
    : [];
  const reference = [unit, ...shown.map(({ unit: text }) => parseUnit(text))].flatMap(
    (each) => each?.reference?.state ?? [],
  );
  const states = [...new Set(reference)].map(
    (state) => `  ${state} volumes at ${STATES[state]}; a sheet states its own`,
  );
  const rows = shown.map(({ unit: text, value }) => `  ${printNumber(value, 7).padStart(14)} ${text}`);
  return `${[head, ...rows, ...gauge, ...states].join('\n')}\n`;
}

function asData({ text, factor, shift, gauge, kind, dimension, reference }: Unit): Record<string, unknown> {
  const rests = reference === undefined ? {} : { reference: reference.state };
  return { unit: text, dimension: describeType({ dimension, kind }), factor, shift, gauge, ...rests };
}

function conversionData({ number, unit }: ParsedQuantity, conversions: readonly Conversion[]): unknown {
  return { antinode: 'conversion/1', value: number, unit: unit.text, dimension: describeType(unit), conversions };
}

function json(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}
