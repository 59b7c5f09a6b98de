import type { CSSProperties, ReactNode } from 'react';
import type { Printed } from '../../core/report/model.ts';

/** The parts of a printed number that are set apart: `-1.05e-6` is `−1`, `.05` and the power −6. */
export interface NumberParts {
  readonly whole: string;
  readonly fraction: string;
  readonly power: string | null;
}

const DECIMAL = /^(-?\d+)(\.\d+)?(?:e([+-]?\d+))?$/i;

export function numberParts(number: string): NumberParts {
  const match = DECIMAL.exec(number);
  if (match === null) return { whole: withMinus(number), fraction: '', power: null };
  const power = match[3] === undefined ? null : withMinus(match[3].replace(/^\+/, ''));
  return { whole: withMinus(match[1] ?? ''), fraction: match[2] ?? '', power };
}

/** A leading hyphen is a minus sign; one inside (`3-1/2`) joins a fraction and stays. */
function withMinus(text: string): string {
  return text.replace(/^-/, '\u2212');
}

/** A number on the line. */
export function PrintedNumber({ number }: { readonly number: string }) {
  const { whole, fraction, power } = numberParts(number);
  return (
    <span className="an-number">
      {whole}
      {fraction}
      <Power power={power} />
    </span>
  );
}

function Power({ power }: { readonly power: string | null }) {
  if (power === null) return null;
  return (
    <>
      {'\u2009×\u200910'}
      <sup>{power}</sup>
    </>
  );
}

/** A number in a column whose numbers stand on their decimal sign: `tail` is the column's longest fraction, in digits. */
export function AlignedNumber({ number, tail }: { readonly number: string; readonly tail: number }) {
  const { whole, fraction, power } = numberParts(number);
  // Feet and inches have no decimal sign to stand on: they end beside their unit.
  const style: CSSProperties = { minWidth: DECIMAL.test(number) ? `${tail}ch` : 0 };
  return (
    <span className="an-number an-aligned">
      <span>{whole}</span>
      <span className="an-fraction" style={style}>
        {fraction}
        <Power power={power} />
      </span>
    </span>
  );
}

/** Digits that the longest fraction of a column takes, its decimal sign counted. */
export function longestTail(numbers: readonly string[]): number {
  return Math.max(0, ...numbers.map((number) => numberParts(number).fraction.length));
}

const UNIT_SIGNS: Readonly<Record<string, string>> = {
  degC: '°C',
  degF: '°F',
  degR: '°R',
  delta_degC: 'Δ°C',
  delta_degF: 'Δ°F',
  deg: '°',
};

/** A unit as a reader knows it: `kg/m^3` with its power raised, `degF` as °F. */
export function UnitText({ unit }: { readonly unit: string }) {
  const parts = unit.split(/(\^-?\d+|[A-Za-z_]+)/).filter((part) => part !== '');
  const nodes: ReactNode[] = parts.map((part, index) => {
    if (part.startsWith('^')) return <sup key={index}>{withMinus(part.slice(1))}</sup>;
    return UNIT_SIGNS[part] ?? part.replaceAll('*', '·');
  });
  return <span className="an-unit">{nodes}</span>;
}

/** A value on the line: number, thin space, unit in lighter ink. */
export function PrintedValue({ printed }: { readonly printed: Printed }) {
  return (
    <span className="an-value">
      <PrintedNumber number={printed.number} />
      {printed.unit !== '' && (
        <>
          {printed.unit === 'deg' ? '' : '\u2009'}
          <UnitText unit={printed.unit} />
        </>
      )}
    </span>
  );
}
