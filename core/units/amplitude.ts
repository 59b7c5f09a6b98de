import type { Amplitude, QuantityType } from './dimension.ts';
import type { TypeFault, TypeResult } from './type-faults.ts';

/** Words behind a unit that say which amplitude it measures. */
export const AMPLITUDE_WORDS: ReadonlyMap<string, Amplitude> = new Map([
  ['pk', 'peak'],
  ['pp', 'peak to peak'],
  ['rms', 'rms'],
]);

/** The word behind a unit that says which amplitude it measures: `pk`, `pp` or `rms`. */
export function amplitudeWord(amplitude: Amplitude): string {
  return amplitude === 'peak' ? 'pk' : amplitude === 'rms' ? 'rms' : 'pp';
}

/** Peak of a single sine over each of its amplitudes. */
const PEAK_OF: Readonly<Record<Amplitude, number>> = { peak: 1, 'peak to peak': 1 / 2, rms: Math.SQRT2 };

/**
 * Factor from one amplitude of a single sine to another: peak to peak = 2 peak, peak = √2 rms. Other waves have no such
 * factor.
 */
export function amplitudeFactor(from: Amplitude, to: Amplitude): number {
  return PEAK_OF[from] / PEAK_OF[to];
}

/** The type of a sum, a difference or a comparison: two amplitudes must be of one kind, and an unmarked value takes the mark. */
export function alike(a: QuantityType, b: QuantityType, verb: string, result: TypeResult): TypeResult {
  if ('fault' in result) return result;
  if (differ(a, b)) return { fault: amplitudesDiffer(a.amplitude, b.amplitude, verb) };
  return marked(result, a.amplitude ?? b.amplitude);
}

/** The type of a product: an amplitude times anything else is an amplitude; the product of two alike is none. */
export function multiplied(a: QuantityType, b: QuantityType, result: TypeResult): TypeResult {
  if ('fault' in result) return result;
  if (differ(a, b)) return { fault: amplitudesDiffer(a.amplitude, b.amplitude, 'multiplied') };
  return a.amplitude !== undefined && b.amplitude !== undefined ? result : marked(result, a.amplitude ?? b.amplitude);
}

/** The type of a quotient: an amplitude over anything else is an amplitude; the ratio of two alike is a plain number. */
export function divided(a: QuantityType, b: QuantityType, result: TypeResult): TypeResult {
  if ('fault' in result) return result;
  if (differ(a, b)) return { fault: amplitudesDiffer(a.amplitude, b.amplitude, 'divided by each other') };
  return b.amplitude === undefined ? marked(result, a.amplitude) : result;
}

/** A type with the mark of an amplitude. A point on a scale has none. */
export function withAmplitude(type: QuantityType, amplitude: Amplitude | undefined): QuantityType {
  const { dimension, kind } = type;
  return amplitude === undefined || kind === 'level' ? { dimension, kind } : { dimension, kind, amplitude };
}

function marked(result: { readonly type: QuantityType }, amplitude: Amplitude | undefined): TypeResult {
  return { type: withAmplitude(result.type, amplitude) };
}

function differ(a: QuantityType, b: QuantityType): boolean {
  return a.amplitude !== undefined && b.amplitude !== undefined && a.amplitude !== b.amplitude;
}

/** What is wrong where two kinds of amplitude meet, and what turns one into the other. */
export function amplitudesDiffer(a: Amplitude | undefined, b: Amplitude | undefined, verb: string): TypeFault {
  return {
    code: 'AMPLITUDES_DIFFER',
    message: `${named(a)} and ${named(b)} are ${verb}`,
    hints: [
      'bring both to one: `as_peak(x)`, `as_peak_to_peak(x)` or `as_rms(x)`, which hold for a single sine; other waves have no such factor',
    ],
  };
}

function named(amplitude: Amplitude | undefined): string {
  return amplitude === 'rms'
    ? 'an rms value'
    : `a ${amplitude ?? 'plain'} value`.replace('peak to peak', 'peak-to-peak');
}
