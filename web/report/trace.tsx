import { useMemo, useState } from 'react';
import type { Block, StepBlock } from '../../core/report/model.ts';
import { blockId } from './block-id.ts';
import { HoldWord, StandingWord } from './standing.tsx';
import { Tex } from './tex.tsx';
import { traceOf, usesOf, type TraceNode } from './trace-tree.ts';
import { PrintedValue } from './typeset.tsx';

interface TraceProps {
  readonly block: Block;
  readonly blocks: ReadonlyMap<string, Block>;
}

/**
 * Where the numbers of a block come from, opened on demand. A page that runs no script carries the direct uses, each a
 * link to its block; opened in the viewer the trace goes back to every input.
 */
export function Trace({ block, blocks }: TraceProps) {
  const [isOpen, setOpen] = useState(false);
  const nodes = useMemo(() => traceOf(block, blocks, isOpen ? Infinity : 1), [block, blocks, isOpen]);
  const methods = block.block === 'step' ? block.methods : [];
  if (usesOf(block).length === 0 && methods.length === 0) return null;
  return (
    <details className="an-trace" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>
        Trace<span className="an-hidden"> of {block.label}</span>
      </summary>
      {methods.map((method) => (
        <Method key={method.function} method={method} />
      ))}
      <TraceList nodes={nodes} />
    </details>
  );
}

function Method({ method }: { readonly method: StepBlock['methods'][number] }) {
  return (
    <p className="an-trace-method">
      <code>{method.function}</code> {method.source}
      {method.validity !== '' && <span className="an-trace-label"> Valid for {method.validity}.</span>}
    </p>
  );
}

function TraceList({ nodes }: { readonly nodes: readonly TraceNode[] }) {
  if (nodes.length === 0) return null;
  return (
    <ul>
      {nodes.map((node) => (
        <li key={node.block.path}>
          <TraceLine node={node} />
          <TraceList nodes={node.uses} />
        </li>
      ))}
    </ul>
  );
}

function TraceLine({ node: { block, isRepeated } }: { readonly node: TraceNode }) {
  return (
    <div className="an-trace-line">
      <a href={`#${blockId(block.path)}`}>
        <TraceValue block={block} />
      </a>
      <span className="an-trace-label">{block.label}</span>
      <Origin block={block} />
      {isRepeated && <span className="an-trace-label">(traced above)</span>}
      <span className="an-trace-place">
        {block.place.file}:{block.place.line}
      </span>
    </div>
  );
}

const WORDS: Readonly<Record<string, string>> = { lookup: 'table', column: 'conditions' };

function TraceValue({ block }: { readonly block: Block }) {
  if (block.block === 'check') return <StandingWord standing={block.standing} />;
  if (block.block !== 'input' && block.block !== 'step' && block.block !== 'taken')
    return WORDS[block.block] ?? block.block;
  return (
    <>
      <Tex tex={block.symbol} /> = <PrintedValue printed={block.printed} />
    </>
  );
}

function Origin({ block }: { readonly block: Block }) {
  const isHeld = 'hold' in block && block.hold !== undefined;
  return (
    <>
      {isHeld && <HoldWord />}
      {block.source !== undefined && <span className="an-trace-source">{block.source}</span>}
      {block.block === 'taken' && <span className="an-trace-source">{block.from}</span>}
      {block.block === 'step' && block.source === undefined && <code>{block.calc}</code>}
    </>
  );
}
