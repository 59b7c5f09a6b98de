import type { Proof } from './model.ts';

/** One reason why a proof fails. */
export interface Fault {
  readonly fault: NonNullable<Proof['fault']>;
  readonly detail: string;
}

/** The mathematics fails: something was altered, or never was what it says. */
export function invalid(detail: string): Fault {
  return { fault: 'invalid', detail };
}

/** All adds up, but it is not what the rules ask for. */
export function notAllowed(detail: string): Fault {
  return { fault: 'not allowed', detail };
}

/** A list with the fault where the condition is broken, so that checks read as a list of what must be so. */
export function unless(condition: boolean, fault: Fault): readonly Fault[] {
  return condition ? [] : [fault];
}

/** Makes the proof: it holds when there is no fault; an `invalid` outweighs a `not allowed`. */
export function judge(subject: string, faults: readonly Fault[], detail: string): Proof {
  if (faults.length === 0) return { subject, holds: true, detail };
  const worst = faults.find(({ fault }) => fault === 'invalid') ?? faults[0];
  return {
    subject,
    holds: false,
    fault: worst?.fault ?? 'invalid',
    detail: faults.map((fault) => fault.detail).join('; '),
  };
}

const LONGEST_QUOTE = 80;

/** Words of the bundle, which anybody may have written, cut short and set apart from our own. */
export function quote(text: string): string {
  return `“${text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE)}…` : text}”`;
}
