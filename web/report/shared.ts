import type { ReactNode } from 'react';
import type { Block, Report } from '../../core/report/model.ts';

/** What every block of one report is drawn with. Kept as one object, so that a block is drawn again only when it changes. */
export interface SharedParts {
  readonly blocks: ReadonlyMap<string, Block>;
  readonly axes: Report['axes'];
  readonly quantities: Report['quantities'];
  /** What stands in the gutter beside a block. */
  readonly renderAside?: ((block: Block) => ReactNode) | undefined;
}

export interface BlockProps<B extends Block> {
  readonly block: B;
  readonly isCurrent: boolean;
  readonly shared: SharedParts;
}
