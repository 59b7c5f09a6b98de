import type { AxisTable } from '../axes/axis.ts';
import { cellText } from '../axes/points.ts';
import type { Shape } from '../axes/shape.ts';
import type { Diagnostic } from '../diagnostics/diagnostic.ts';

/**
 * What is wrong with a formula, over all cases: the same fault at many points is said once, with the first point where it
 * was met and the number of the others.
 */
export class Findings {
  private looked = 0;
  private readonly met = new Map<string, { readonly first: Diagnostic; readonly where: string; others: number }>();

  /** Whether another case is to be looked at: what so many had to say is enough, and looking takes time. */
  wantsMore(): boolean {
    return this.looked < MOST_CASES;
  }

  /** Collects what one case has to say; to be closed when the case is done. */
  at(cell: number, shape: Shape, axes: AxisTable): { readonly diagnostics: Diagnostic[]; readonly close: () => void } {
    this.looked += 1;
    const diagnostics: Diagnostic[] = [];
    const close = (): void => {
      for (const diagnostic of diagnostics) this.add(diagnostic, cell, shape, axes);
    };
    return { diagnostics, close };
  }

  all(): Diagnostic[] {
    return [...this.met.values()].map(({ first, where, others }) =>
      where === ''
        ? first
        : { ...first, message: `${first.message} (at ${where}${others === 0 ? '' : this.othersText(others)})` },
    );
  }

  private add(diagnostic: Diagnostic, cell: number, shape: Shape, axes: AxisTable): void {
    const { code, span, severity } = diagnostic;
    const key = `${code} ${severity} ${span.file} ${span.start} ${span.end}`;
    const known = this.met.get(key);
    if (known !== undefined) known.others += 1;
    else this.met.set(key, { first: diagnostic, where: cellText(cell, shape, axes), others: 0 });
  }

  private othersText(others: number): string {
    if (!this.wantsMore()) return `, and at more than ${others} other points`;
    return others === 1 ? ', and at one more point' : `, and at ${others} more points`;
  }
}

/** Cases of one formula that are looked at one by one. */
const MOST_CASES = 20_000;
