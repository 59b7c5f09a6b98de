/** Which revision: the three parts of its address. */
export interface RevisionRef {
  readonly study: string;
  readonly number: string;
  readonly revision: string;
}
