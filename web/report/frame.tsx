import type { HTMLAttributes, ReactNode } from 'react';
import type { Block } from '../../core/report/model.ts';
import { blockId } from './block-id.ts';
import type { SharedParts } from './shared.ts';

/** Attributes by which a block can be linked to, found for the margin, and seen to be the current one. */
export function blockAttributes(block: Block, isCurrent: boolean, className: string) {
  return {
    id: blockId(block.path),
    'data-path': block.path,
    className: `an-block ${className}${isCurrent ? ' an-current' : ''}`,
    ...(isCurrent ? { 'aria-current': 'true' as const } : {}),
  } satisfies HTMLAttributes<HTMLElement> & { 'data-path': string };
}

interface FrameProps {
  readonly block: Block;
  readonly isCurrent: boolean;
  readonly shared: SharedParts;
  readonly className: string;
  readonly children: ReactNode;
}

/** One block as an element of its own, with its place in the gutter. */
export function Frame({ block, isCurrent, shared, className, children }: FrameProps) {
  return (
    <div {...blockAttributes(block, isCurrent, className)}>
      <Aside block={block} shared={shared} />
      {children}
    </div>
  );
}

export function Aside({ block, shared }: { readonly block: Block; readonly shared: SharedParts }) {
  if (shared.renderAside === undefined) return null;
  return <div className="an-aside">{shared.renderAside(block)}</div>;
}
