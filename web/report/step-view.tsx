import { memo } from 'react';
import type { StepBlock } from '../../core/report/model.ts';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { Expected, Spread } from './spread.tsx';
import { Tex } from './tex.tsx';
import { Trace } from './trace.tsx';
import { WholeTable } from './whole-table.tsx';

/** An equals sign after which no line breaks: a link is broken before it. */
const EQUALS = '{=}\\;';

/** A step: what it is and where it comes from, then symbol = formula = numbers = result. */
export const StepView = memo(function StepView({ block, isCurrent, shared }: BlockProps<StepBlock>) {
  const source = stepSource(block);
  const quantity = shared.quantities[block.name];
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-step">
      <div className="an-step-head">
        {/* A step without a label of its own is called by its name, which the formula says already. */}
        <span className="an-label">{block.label === block.name ? '' : block.label}</span>
        {source !== '' && <span className="an-source">{source}</span>}
      </div>
      <StepLine block={block} />
      {block.extent !== undefined && <Spread extent={block.extent} />}
      {block.expect !== undefined && (
        <p className="an-spread">
          <Expected expect={block.expect} />
        </p>
      )}
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
      {quantity !== undefined && <WholeTable quantity={quantity} />}
      <Trace block={block} blocks={shared.blocks} />
    </Frame>
  );
});

/**
 * The chain of equals signs. Each link is set by itself, so that a narrow page breaks before an equals sign and the
 * parts can differ in ink; links that would only repeat their neighbour are left out.
 */
function StepLine({ block }: { readonly block: StepBlock }) {
  const { symbol, formula, substituted, printed, at } = block;
  const isOne = at === undefined;
  return (
    <>
      <div className="an-equation">
        <Tex tex={`\\displaystyle ${symbol} = ${formula}`} className="an-link" />
        {isOne && substituted !== formula && substituted !== printed.tex && (
          <Tex tex={`\\displaystyle ${EQUALS}${substituted}`} className="an-link an-substituted" />
        )}
        {formula !== printed.tex && <Tex tex={`${EQUALS}${printed.tex}`} className="an-link an-result" />}
      </div>
      {!isOne && substituted !== formula && <CaseLine block={block} at={at} />}
    </>
  );
}

/** Of several cases, one with its numbers put in: the one of the largest magnitude. */
function CaseLine({ block, at }: { readonly block: StepBlock; readonly at: string }) {
  const { symbol, substituted, extent } = block;
  const value = [extent?.greatest, extent?.least].find((extreme) => extreme?.at === at);
  return (
    <div className="an-equation an-case">
      <span className="an-case-word">at {at}</span>
      <Tex tex={`\\displaystyle ${symbol} = ${substituted}`} className="an-link an-substituted" />
      {value !== undefined && <Tex tex={`${EQUALS}${value.printed.tex}`} className="an-link an-substituted" />}
    </div>
  );
}

/** The engineer's own source before those of the methods that the formula calls. */
function stepSource(block: StepBlock): string {
  if (block.source !== undefined) return block.source;
  return [...new Set(block.methods.map((method) => method.source))].join('; ');
}
