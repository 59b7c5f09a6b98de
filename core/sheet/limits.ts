/** A sheet is text that people write and check; these limits stop what is none, before it takes time or memory. */
export const LIMITS = {
  /** UTF-16 units. */
  characters: 1_000_000,
  /** Brackets within brackets, and mappings within mappings. */
  depth: 20,
  /** Values of all kinds. */
  values: 50_000,
  /** Inputs and steps together. */
  names: 5_000,
  /** Points along one axis. */
  points: 20_000,
  /** Values of all quantities over their axes. */
  cells: 4_000_000,
  /** Operations on single values: some seconds of computing on any machine. */
  work: 1_000_000_000,
  /** Characters of a value that is set from outside. */
  override: 500,
  /** Files that a sheet uses. */
  files: 40,
} as const;
