import { isAxisName, sameAxis, type Axis, type AxisName } from '../axes/axis.ts';
import type { Nested } from '../axes/column.ts';
import { error, warning, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { EvaluatedTake } from '../report/evaluated-sheet.ts';
import type { SheetDocument, TakeNode } from '../sheet/document.ts';
import { LOCK_FILE } from '../sheet/file-names.ts';
import { toSi } from '../units/convert.ts';
import { inSystem } from '../units/display.ts';
import { parseUnit } from '../units/parse-unit.ts';
import { missingFromSite, NO_SITE } from '../units/site.ts';
import { typeOfUnit } from '../units/unit.ts';
import { readLock, type LockedQuantity, type LockedRevision } from './lock.ts';

export interface Takes {
  readonly taken: ReadonlyMap<string, EvaluatedTake>;
  readonly diagnostics: readonly Diagnostic[];
}

/**
 * Finds the values that a sheet takes from revisions of other sheets, in the lock file beside it. A revision never changes,
 * so neither does what was taken from it; that a later one is issued is said as a warning.
 *
 * @param lockText text of the lock file, where there is one
 * @param axes     takes along an axis that the sheet has not yet add it
 */
export function readTakes(
  { take }: SheetDocument,
  lockText: string | undefined,
  axes: Map<AxisName, Axis>,
  units: 'us' | 'si' | undefined,
): Takes {
  if (take.length === 0) return { taken: new Map(), diagnostics: [] };
  const lock = readLock(lockText);
  if (lock === null) {
    const [first] = take;
    const span = first?.from.span ?? { file: LOCK_FILE, start: 0, end: 0 };
    return {
      taken: new Map(),
      diagnostics: [
        error('TAKE_MISSING', span, `\`${LOCK_FILE}\` is not a lock file`, {
          hints: ['write it anew by `antinode pull`'],
        }),
      ],
    };
  }
  const diagnostics: Diagnostic[] = [];
  const taken = new Map<string, EvaluatedTake>();
  for (const node of take) {
    // Of a text that names no revision, the schema has said so.
    if (!REFERENCE.test(node.from.text)) continue;
    const found = new TakeReader(node, lock, axes, diagnostics).read(units);
    if (found !== undefined) taken.set(node.name.text, found);
  }
  return { taken, diagnostics };
}

const REFERENCE = /^\S+@\S+#\S+$/;

class TakeReader {
  private readonly node: TakeNode;
  private readonly lock: ReadonlyMap<string, LockedRevision>;
  private readonly axes: Map<AxisName, Axis>;
  private readonly diagnostics: Diagnostic[];

  constructor(
    node: TakeNode,
    lock: ReadonlyMap<string, LockedRevision>,
    axes: Map<AxisName, Axis>,
    diagnostics: Diagnostic[],
  ) {
    this.node = node;
    this.lock = lock;
    this.axes = axes;
    this.diagnostics = diagnostics;
  }

  read(units: 'us' | 'si' | undefined): EvaluatedTake | undefined {
    const { text } = this.node.from;
    const [reference = '', name = ''] = text.split('#');
    const revision = this.lock.get(reference);
    if (revision === undefined) {
      return this.fault('TAKE_MISSING', `\`${reference}\` is not in \`${LOCK_FILE}\``, [
        `fetch it: \`antinode pull ${reference}\``,
      ]);
    }
    const quantity = revision.quantities.get(name);
    if (quantity === undefined) {
      const near = nearest(name, revision.quantities.keys(), 2);
      return this.fault(
        'TAKE_MISSING',
        `\`${reference}\` has no quantity \`${name}\``,
        near.length > 0 ? [`did you mean \`${near.join('`, `')}\`?`] : [],
      );
    }
    if (revision.newest !== undefined) this.warnStale(reference, revision.newest);
    return this.evaluated(quantity, revision, units);
  }

  private evaluated(
    quantity: LockedQuantity,
    { digest }: LockedRevision,
    units: 'us' | 'si' | undefined,
  ): EvaluatedTake | undefined {
    const unit = parseUnit(quantity.unit);
    if (unit === null)
      return this.fault(
        'TAKE_MISSING',
        `the revision is written in \`${quantity.unit}\`, a unit that is not known here`,
        [],
      );
    for (const { name, values, unit: axisUnit } of quantity.axes) {
      if (!isAxisName(name))
        return this.fault('TAKE_MISSING', `the revision varies along \`${name}\`, an axis that is not known here`, []);
      const axis = axisOf(name, values, axisUnit);
      const known = this.axes.get(name);
      if (axis === null || (known !== undefined && !sameAxis(known, axis))) {
        return this.fault('AXIS_CONFLICT', `the value varies along \`${name}\`, over other points than this sheet`, [
          'take one value: bring the axis down in the other sheet, or use the same conditions',
        ]);
      }
      this.axes.set(name, axis);
    }
    const axes = quantity.axes.flatMap(({ name }) => (isAxisName(name) ? [name] : []));
    const column = { axes, data: Float64Array.from(flat(quantity.si)) };
    const shown = units === undefined ? unit : inSystem(unit, units);
    const value = { type: typeOfUnit(unit), column, unit: shown };
    return { node: this.node, value, revision: digest };
  }

  private warnStale(reference: string, newest: string): void {
    this.diagnostics.push(
      warning('TAKE_STALE', this.node.from.span, `\`${reference}\` is superseded: revision ${newest} is issued`, {
        hints: ['look at what changed, then pin the later revision'],
      }),
    );
  }

  private fault(code: Diagnostic['code'], message: string, hints: readonly string[]): undefined {
    this.diagnostics.push(error(code, this.node.from.span, message, { hints }));
    return undefined;
  }
}

function axisOf(name: AxisName, values: readonly (string | number)[], unitText: string | undefined): Axis | null {
  if (values.every((value) => typeof value === 'string')) return { name, ids: values };
  const unit = parseUnit(unitText ?? '1');
  if (unit === null || missingFromSite(unit, NO_SITE) !== null) return null;
  if (!values.every((value) => typeof value === 'number')) return null;
  const coordinates = Float64Array.from(values, (value) => toSi(value, unit, NO_SITE));
  return { name, coordinates, type: typeOfUnit(unit), unit };
}

function flat(nested: Nested): number[] {
  return typeof nested === 'number' ? [nested] : nested.flatMap(flat);
}
