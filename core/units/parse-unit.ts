import { nearest } from '../diagnostics/nearest.ts';
import { power } from '../numeric/math.ts';
import { AMPLITUDE_WORDS, amplitudeWord } from './amplitude.ts';
import type { Amplitude, Kind } from './dimension.ts';
import { isNumber, multiplyDimensions, NUMBER, powerDimension } from './dimensions.ts';
import { namedUnit, UNIT_NAMES } from './table.ts';
import { computedType } from './type-algebra.ts';
import type { Unit, UnitSystem } from './unit.ts';

/** A unit text is short; anything longer is not one. */
const MAX_LENGTH = 60;

/**
 * Reads a unit: a name of the table (`psig`, `in`), or a product of powers (`kg/m^3`, `J/(kg*K)`, `BTU/lb/degF`, `N·m`, `in²`).
 * A slash divides by the one factor, or the bracket, that follows it.
 *
 * @returns null when the text is not a unit
 */
export function parseUnit(text: string): Unit | null {
  const [, bare, word] = AMPLITUDE.exec(text.trim()) ?? [];
  if (bare === undefined || word === undefined) return parseBare(text);
  const unit = parseBare(bare);
  const amplitude = AMPLITUDE_WORDS.get(word);
  return unit === null || amplitude === undefined || unit.kind === 'level' ? null : unitOfAmplitude(unit, amplitude);
}

/** A unit behind which a word says which amplitude it measures: `mil pp`, `mm/s rms`, `in/s pk`. */
const AMPLITUDE = /^(.*\S)\s+(pk|pp|rms)$/;

/** A unit that measures an amplitude, whatever it measured before. */
export function unitOfAmplitude(unit: Unit, amplitude: Amplitude): Unit {
  const bare = bareUnit(unit);
  const word = amplitudeWord(amplitude);
  return { ...bare, text: `${bare.text} ${word}`, tex: `${bare.tex}\\ \\text{${word}}`, amplitude };
}

/** A unit without its amplitude. */
export function bareUnit(unit: Unit): Unit {
  if (unit.amplitude === undefined) return unit;
  const bare = parseBare(AMPLITUDE.exec(unit.text)?.[1] ?? '');
  if (bare === null) throw new Error(`no unit in ${unit.text}`);
  return bare;
}

function parseBare(text: string): Unit | null {
  const written = plainSpelling(text);
  if (written === '' || written.length > MAX_LENGTH) return null;
  const named = namedUnit(written);
  if (named !== undefined) return named;
  const parser = new UnitParser(tokens(written));
  const product = parser.product();
  return product === null || !parser.atEnd() ? null : compound(written, product);
}

/** Units that were probably meant: common slips first, then the nearest names. */
export function suggestUnits(text: string): string[] {
  const [, bare, word] = AMPLITUDE.exec(text.trim()) ?? [];
  if (bare !== undefined && word !== undefined) {
    const isLevel = parseBare(bare)?.kind === 'level';
    return (isLevel ? (DIFFERENCES.get(bare.trim()) ?? []) : suggestUnits(bare)).map((unit) => `${unit} ${word}`);
  }
  const slip = SLIPS.get(text.trim()) ?? SLIPS.get(text.trim().toLowerCase());
  if (slip !== undefined) return [...slip];
  const power = /^([A-Za-z]+)([234])$/.exec(text.trim());
  if (power?.[1] !== undefined && namedUnit(power[1]) !== undefined) return [`${power[1]}^${power[2]}`];
  const near = nearest(text.trim(), UNIT_NAMES, 3);
  // Where only capitals differ, nothing else was meant.
  const sameLetters = near.filter((name) => name.toLowerCase() === text.trim().toLowerCase());
  return sameLetters.length > 0 ? sameLetters : near;
}

/** An amplitude is a difference; this one is meant where a level is written. */
const DIFFERENCES: ReadonlyMap<string, readonly string[]> = new Map([
  ['psig', ['psi']],
  ['psia', ['psi']],
  ['barg', ['bar']],
  ['bara', ['bar']],
  ['kPag', ['kPa']],
  ['kPaa', ['kPa']],
  ['degC', ['delta_degC']],
  ['degF', ['delta_degF']],
]);

const SLIPS: ReadonlyMap<string, readonly string[]> = new Map([
  ['c', ['degC']],
  ['°c', ['degC']],
  ['celsius', ['degC']],
  ['deg c', ['degC']],
  ['f', ['degF']],
  ['°f', ['degF']],
  ['fahrenheit', ['degF']],
  ['deg f', ['degF']],
  ['r', ['degR']],
  ['kelvin', ['K']],
  ['psi g', ['psig']],
  ['psi a', ['psia']],
  ['psi(g)', ['psig']],
  ['psi(a)', ['psia']],
  ['bar g', ['barg']],
  ['bar a', ['bara']],
  ['bar(g)', ['barg']],
  ['bar(a)', ['bara']],
  ['lbs', ['lbm', 'lbf']],
  ['pound', ['lbm', 'lbf']],
  ['pounds', ['lbm', 'lbf']],
  ['"', ['in']],
  ["'", ['ft']],
  ['kg/cm2', ['bar', 'kgf/cm^2']],
  ['percent', ['%']],
  ['hertz', ['Hz']],
  ['cps', ['Hz']],
]);

interface Factor {
  readonly unit: Unit;
  readonly exponent: number;
}

interface UnitToken {
  readonly kind: 'name' | 'number' | 'symbol';
  readonly text: string;
}

const SUPERSCRIPTS: Readonly<Record<string, string>> = { '²': '^2', '³': '^3', '⁴': '^4' };

/** `in ²` and `N·m` as they are written with the keys of a keyboard: `in^2`, `N*m`. */
function plainSpelling(text: string): string {
  return text
    .replace(/[²³⁴]/g, (digit) => SUPERSCRIPTS[digit] ?? digit)
    .replaceAll('·', '*')
    .replace(/\s*([*/^()])\s*/g, '$1')
    .trim();
}

function tokens(plain: string): UnitToken[] {
  const found: UnitToken[] = [];
  const pattern = /\s*(?:([A-Za-zµμ°%][A-Za-z0-9_µμ%]*(?:-[A-Za-z0-9]+)*)|(-?\d+(?:\.\d+)?)|([*/^()]))/gy;
  let at = 0;
  for (let match = pattern.exec(plain); match !== null; match = pattern.exec(plain)) {
    at = pattern.lastIndex;
    if (match[1] !== undefined) found.push({ kind: 'name', text: match[1] });
    else if (match[2] !== undefined) found.push({ kind: 'number', text: match[2] });
    else found.push({ kind: 'symbol', text: match[3] ?? '' });
  }
  return at === plain.length ? found : [];
}

class UnitParser {
  private readonly list: readonly UnitToken[];
  private next = 0;

  constructor(list: readonly UnitToken[]) {
    this.list = list;
  }

  atEnd(): boolean {
    return this.next === this.list.length;
  }

  product(): Factor[] | null {
    const factors: Factor[] = [];
    for (let sign = 1; ;) {
      const factor = this.factor();
      if (factor === null) return null;
      for (const { unit, exponent } of factor) factors.push({ unit, exponent: exponent * sign });
      if (this.take('*')) sign = 1;
      else if (this.take('/')) sign = -1;
      else return factors;
    }
  }

  private factor(): Factor[] | null {
    const base = this.take('(') ? this.bracket() : this.named();
    if (base === null || !this.take('^')) return base;
    const bracketed = this.take('(');
    const exponent = this.list[this.next];
    if (exponent?.kind !== 'number') return null;
    this.next += 1;
    if (bracketed && !this.take(')')) return null;
    return base.map((factor) => ({ ...factor, exponent: factor.exponent * Number(exponent.text) }));
  }

  private bracket(): Factor[] | null {
    const inside = this.product();
    return inside !== null && this.take(')') ? inside : null;
  }

  private named(): Factor[] | null {
    const token = this.list[this.next];
    // `1/s` has a one above the line.
    const unit = token?.kind === 'number' && token.text !== '1' ? undefined : token && namedUnit(token.text);
    if (unit === undefined) return null;
    this.next += 1;
    return [{ unit, exponent: 1 }];
  }

  private take(symbol: string): boolean {
    const token = this.list[this.next];
    if (token?.kind !== 'symbol' || token.text !== symbol) return false;
    this.next += 1;
    return true;
  }
}

/** In a product, a temperature is a difference (J/kg/degF) and a gauge pressure has no meaning. */
function compound(text: string, factors: readonly Factor[]): Unit | null {
  if (factors.some(({ unit }) => unit.gauge || (unit.kind === 'level' && unit.shift === 0))) return null;
  if (factors.length === 1 && factors[0]?.exponent === 1) return factors[0].unit;
  const reference = compoundReference(factors);
  if (reference === null) return null;
  let dimension = NUMBER;
  let factor = 1;
  for (const { unit, exponent } of factors) {
    dimension = multiplyDimensions(dimension, powerDimension(unit.dimension, exponent));
    factor *= power(unit.factor, exponent);
  }
  const kind = compoundKind(factors) ?? computedType(dimension).kind;
  return {
    text,
    tex: compoundTex(factors),
    dimension,
    kind,
    factor,
    shift: 0,
    gauge: false,
    system: systemOf(factors),
    ...(reference === undefined ? {} : { reference }),
  };
}

/** Of normal and standard volumes in one unit nobody could tell which amount is meant: null. */
function compoundReference(factors: readonly Factor[]): Unit['reference'] | null {
  const references = factors.flatMap(({ unit, exponent }) =>
    unit.reference === undefined ? [] : [{ state: unit.reference.state, power: unit.reference.power * exponent }],
  );
  const [first] = references;
  if (first === undefined) return undefined;
  if (references.some(({ state }) => state !== first.state)) return null;
  const sum = references.reduce((total, reference) => total + reference.power, 0);
  return sum === 0 ? undefined : { state: first.state, power: sum };
}

/** `rev/s` and `deg/s` keep counting what they count; `m*rad/s` does not. */
function compoundKind(factors: readonly Factor[]): Kind | undefined {
  const angle = factors.filter(
    ({ unit }) => isNumber(unit.dimension) && (unit.kind === 'cycles' || unit.kind === 'radians'),
  );
  const rest = factors.filter((factor) => !angle.includes(factor));
  const isRate = angle.length === 1 && angle[0]?.exponent === 1 && rest.length === 1 && rest[0]?.exponent === -1;
  return isRate && rest[0]?.unit.dimension[2] === 1 ? angle[0]?.unit.kind : undefined;
}

function compoundTex(factors: readonly Factor[]): string {
  const part = (sign: 1 | -1): string[] =>
    factors.flatMap(({ unit, exponent }) =>
      exponent * sign > 0 ? [exponent * sign === 1 ? unit.tex : `{${unit.tex}}^{${exponent * sign}}`] : [],
    );
  const above = part(1).join('{\\cdot}') || '1';
  const below = part(-1);
  if (below.length === 0) return above;
  const divisor = below.join('{\\cdot}');
  return `${above}/${below.length > 1 ? `(${divisor})` : divisor}`;
}

function systemOf(factors: readonly Factor[]): UnitSystem {
  const systems = factors.map(({ unit }) => unit.system).filter((system) => system !== 'both');
  if (systems.length === 0) return 'both';
  return systems.every((system) => system === systems[0]) ? (systems[0] ?? 'both') : 'both';
}
