import { validateBundle } from './generated/validate-bundle.js';
import type { Bundle, Proof } from './model.ts';
import { bundleText } from './seal-bundle.ts';
import { invalid, judge, notAllowed, quote, unless, type Fault } from './verdict.ts';

/** Larger files are refused unread: bytes, or characters where the file comes as text. */
export const LARGEST_BUNDLE = 20_000_000;

/** A file of nothing but tiny values would cost gigabytes in faults found: no report comes near as many. */
const MOST_VALUES = 1_000_000;

const FAULTS_SHOWN = 3;

export interface ReadBundle {
  /** Absent where the file has not the shape of a bundle, so that nothing in it can be looked at. */
  readonly bundle?: Bundle;
  readonly proof: Proof;
}

/**
 * First look at a bundle file, all of it attacker-controlled: size, encoding, JSON, schema, and that it is spelt in the
 * one canonical way. A bundle that is only spelt otherwise is still handed on, for the other proofs to be made.
 */
export function readBundle(file: string | Uint8Array): ReadBundle {
  const parsed = parse(file);
  if ('fault' in parsed) return { proof: prove([parsed]) };
  const { text, value } = parsed;
  if (isCrowded(value)) return { proof: prove([notAllowed(`it holds more than ${MOST_VALUES} values`)]) };
  if (!validateBundle(value)) return { proof: prove([schemaFault()]) };
  const canonical = canonicalText(value);
  if (canonical === null) return { proof: prove([invalid('it holds text that is not Unicode')]) };
  const fault = invalid('it is not written in the canonical form of its content, so its bytes were changed');
  return { bundle: value, proof: prove(unless(text === canonical, fault)) };
}

function prove(faults: readonly Fault[]): Proof {
  return judge('Form of the file', faults, 'a bundle in canonical form');
}

function parse(file: string | Uint8Array): { readonly text: string; readonly value: unknown } | Fault {
  if (file.length > LARGEST_BUNDLE) return notAllowed(`it is larger than ${LARGEST_BUNDLE / 1e6} MB`);
  const text = decode(file);
  if (text === null) return invalid('it is not UTF-8 text');
  try {
    return { text, value: JSON.parse(text) as unknown };
  } catch {
    // The parser's message would quote the file at length; that it is not JSON says it all.
    return invalid('it is not JSON');
  }
}

/** Strict: neither a byte order mark nor a byte that is not UTF-8 may vanish from what is verified. */
function decode(file: string | Uint8Array): string | null {
  if (typeof file === 'string') return file;
  try {
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(file);
  } catch {
    return null;
  }
}

/** Counts without recursion, since the depth is the attacker's choice too. */
function isCrowded(root: unknown): boolean {
  const waiting = [root];
  let count = 1;
  while (waiting.length > 0) {
    const value = waiting.pop();
    if (typeof value !== 'object' || value === null) continue;
    const inside: readonly unknown[] = Array.isArray(value) ? value : Object.values(value);
    count += inside.length;
    if (count > MOST_VALUES) return true;
    for (const item of inside) waiting.push(item);
  }
  return false;
}

function schemaFault(): Fault {
  const errors = validateBundle.errors ?? [];
  const shown = errors.slice(0, FAULTS_SHOWN).map(({ instancePath, message = 'is wrong' }) => {
    return `${instancePath === '' ? 'the bundle' : quote(instancePath)} ${message}`;
  });
  const more = errors.length > FAULTS_SHOWN ? `, and ${errors.length - FAULTS_SHOWN} more` : '';
  return invalid(`it has not the shape of a bundle: ${shown.join(', ')}${more}`);
}

function canonicalText(bundle: Bundle): string | null {
  try {
    return bundleText(bundle);
  } catch (error) {
    if (error instanceof TypeError) return null;
    throw error;
  }
}
