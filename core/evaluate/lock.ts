import type { Nested } from '../axes/column.ts';

/** A quantity of a revision, as the lock file keeps it. */
export interface LockedQuantity {
  readonly unit: string;
  readonly si: Nested;
  readonly axes: readonly {
    readonly name: string;
    readonly values: readonly (string | number)[];
    readonly unit?: string;
  }[];
}

export interface LockedRevision {
  /** Digest of the revision's report. */
  readonly digest: string;
  /** The latest issued revision, where it is another one. */
  readonly newest?: string;
  readonly quantities: ReadonlyMap<string, LockedQuantity>;
}

/** The file that pins what sheets of a folder take from revisions of other sheets. */
export interface LockFile {
  readonly antinode: 'lock/1';
  readonly revisions: Readonly<
    Record<
      string,
      Omit<LockedRevision, 'quantities'> & { readonly quantities: Readonly<Record<string, LockedQuantity>> }
    >
  >;
}

/** Revisions by `NUMBER@REVISION`; null where the text is no lock file. Without a file there are none. */
export function readLock(text: string | undefined): ReadonlyMap<string, LockedRevision> | null {
  if (text === undefined) return new Map();
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch {
    return null;
  }
  if (!isLockFile(data)) return null;
  return new Map(
    Object.entries(data.revisions).map(([reference, revision]) => [
      reference,
      { ...revision, quantities: new Map(Object.entries(revision.quantities)) },
    ]),
  );
}

const DIGEST = /^sha256-[0-9a-f]{64}$/;

function isLockFile(data: unknown): data is LockFile {
  if (!isRecord(data) || data['antinode'] !== 'lock/1' || !isRecord(data['revisions'])) return false;
  return Object.values(data['revisions']).every(
    (revision) =>
      isRecord(revision) &&
      typeof revision['digest'] === 'string' &&
      DIGEST.test(revision['digest']) &&
      ['string', 'undefined'].includes(typeof revision['newest']) &&
      isRecord(revision['quantities']) &&
      Object.values(revision['quantities']).every(isQuantity),
  );
}

function isQuantity(value: unknown): boolean {
  return (
    isRecord(value) &&
    typeof value['unit'] === 'string' &&
    Array.isArray(value['axes']) &&
    value['axes'].every(
      (axis) => isRecord(axis) && typeof axis['name'] === 'string' && Array.isArray(axis['values']),
    ) &&
    hasShape(
      value['si'],
      value['axes'].map((axis: { values: unknown[] }) => axis.values.length),
    )
  );
}

/** Whether arrays are nested as the axes say, with finite numbers at the bottom. */
function hasShape(si: unknown, [size, ...inner]: readonly number[]): boolean {
  if (size === undefined) return typeof si === 'number' && Number.isFinite(si);
  return Array.isArray(si) && si.length === size && si.every((part) => hasShape(part, inner));
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
