/** A limit of a standard as data: which text it comes from, and its figures. The adopted edition governs, so it is named. */
export interface LimitEntry<Figures> {
  readonly id: string;
  readonly title: string;
  readonly standard: string;
  readonly edition: string;
  readonly clause: string;
  /** What the limited figure is, and what it is a share of. */
  readonly basis: string;
  /** How far the figures can be trusted: none is a copy of the standard's text. */
  readonly status: 'verify against your edition';
  readonly figures: Figures;
}
