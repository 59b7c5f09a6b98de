import { COMPONENT_IDS, findComponent } from './find-component.ts';

/** Sums of fractions this far from one are the rounding of a printed analysis, and are scaled to one with a note. */
const ROUNDING_OF_ANALYSIS = 0.005;
/** Below this a scaling changes no printed digit, and is not worth a word. */
const ROUNDING_OF_NUMBERS = 1e-6;

/** The share of one component, as a sheet gives it: 91.3 % is 0.913. */
export interface Amount {
  readonly component: string;
  readonly value: number;
}

/** What is wrong with the definition of a gas, or worth a note. */
export interface GasFault {
  readonly code: 'GAS_COMPONENT' | 'GAS_FRACTIONS' | 'GAS_METHOD';
  readonly severity: 'error' | 'warning';
  readonly message: string;
  readonly hints: readonly string[];
  /** Position of the amount it is about; the gas as a whole when absent. */
  readonly index?: number;
  /** A name that is not known, and those that are: the caller offers the nearest, spelling being no part of physics. */
  readonly unknown?: { readonly name: string; readonly known: readonly string[] };
}

export interface Composition {
  /** By component id, adding up to one; present where no fault is an error. */
  readonly moleFractions?: ReadonlyMap<string, number>;
  readonly faults: readonly GasFault[];
}

/** Names that stand for more than one component, and the ids that they may mean. */
const AMBIGUOUS: ReadonlyMap<string, readonly string[]> = new Map(
  [
    { names: ['butane', 'c4', 'c4h10'], ids: ['n_butane', 'isobutane'] },
    { names: ['pentane', 'c5', 'c5h12'], ids: ['n_pentane', 'isopentane', 'neopentane'] },
  ].flatMap(({ names, ids }) => names.map((name) => [name, ids] as const)),
);

/** Mole fractions from the amounts of a sheet: every component known and named once, all adding up to one. */
export function readComposition(amounts: readonly Amount[]): Composition {
  const faults: GasFault[] = [];
  const fractions = new Map<string, number>();
  const namedAs = new Map<string, string>();
  const total = amounts.reduce((sum, { value }) => sum + value, 0);
  const signsLeftOut = Math.abs(total / 100 - 1) <= ROUNDING_OF_ANALYSIS;
  amounts.forEach(({ component: text, value }, index) => {
    const component = findComponent(text);
    if (component === undefined) faults.push(unknownComponent(text, index));
    else if (namedAs.has(component.id)) faults.push(namedTwice(text, namedAs.get(component.id) ?? '', index));
    else namedAs.set(component.id, text);
    const wrong = wrongAmount(text, value, index, signsLeftOut);
    if (wrong !== undefined) faults.push(wrong);
    else if (component !== undefined && value > 0) fractions.set(component.id, value);
  });
  return faults.length > 0 ? { faults } : scaleToOne(fractions);
}

function unknownComponent(text: string, index: number): GasFault {
  const fault = { code: 'GAS_COMPONENT', severity: 'error', index } as const;
  const meanings = AMBIGUOUS.get(text.trim().toLowerCase());
  if (meanings === undefined) {
    const message = `no component is named \`${text}\``;
    return { ...fault, message, hints: [], unknown: { name: text, known: COMPONENT_IDS } };
  }
  const message = `\`${text}\` does not say which of its isomers is meant`;
  return { ...fault, message, hints: [`write \`${meanings.join('` or `')}\``] };
}

function namedTwice(text: string, first: string, index: number): GasFault {
  const message =
    text === first ? `\`${text}\` is given twice` : `\`${text}\` is given twice: \`${first}\` is the same component`;
  return { code: 'GAS_COMPONENT', severity: 'error', message, hints: ['give each component once'], index };
}

function wrongAmount(text: string, value: number, index: number, signsLeftOut: boolean): GasFault | undefined {
  const fault = { code: 'GAS_FRACTIONS', severity: 'error', index } as const;
  if (value < 0) return { ...fault, message: `the share of \`${text}\` is negative`, hints: [] };
  if (value <= 1 + ROUNDING_OF_ANALYSIS) return undefined;
  const hints = signsLeftOut ? [`write mole percent with its sign: \`${value} %\``] : [];
  return { ...fault, message: `the share of \`${text}\` is more than the whole gas`, hints };
}

function scaleToOne(fractions: ReadonlyMap<string, number>): Composition {
  const sum = [...fractions.values()].reduce((total, fraction) => total + fraction, 0);
  const deviation = Math.abs(sum - 1);
  const percent = `${Number((sum * 100).toPrecision(6))} %`;
  if (deviation > ROUNDING_OF_ANALYSIS) {
    const hints = ['they must add up to 100 %; a rounding of up to 0.5 % is scaled away'];
    const message = `the shares of the components add up to ${percent}`;
    return { faults: [{ code: 'GAS_FRACTIONS', severity: 'error', message, hints }] };
  }
  const moleFractions = new Map([...fractions].map(([id, fraction]) => [id, fraction / sum]));
  if (deviation <= ROUNDING_OF_NUMBERS) return { moleFractions, faults: [] };
  const message = `the shares of the components add up to ${percent}, and are scaled to 100 %`;
  return { moleFractions, faults: [{ code: 'GAS_FRACTIONS', severity: 'warning', message, hints: [] }] };
}
