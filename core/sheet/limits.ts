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
} as const;
