import type { Block, InputBlock, ReportSection, StatementBlock } from '../../core/report/model.ts';
import { blockId } from './block-id.ts';
import { LookupView, TakenView } from './basis-views.tsx';
import { CheckView } from './check-view.tsx';
import { ConditionsTable } from './conditions-table.tsx';
import { FigureView } from './figure-view.tsx';
import { Frame } from './frame.tsx';
import { GasView } from './gas-view.tsx';
import { InputsTable } from './inputs-table.tsx';
import { Prose } from './prose.tsx';
import { ResultTable } from './result-table.tsx';
import type { SharedParts } from './shared.ts';
import { StepView } from './step-view.tsx';

/**
 * The engineer's sections carry the number that their paths have (`sections/2`), so that prose, trace and remarks mean
 * the same by "section 2". The basis before them has none.
 */
export function sectionNumber(path: string): string | null {
  return /^sections\/(\d+)$/.exec(path)?.[1] ?? null;
}

interface SectionViewProps {
  readonly section: ReportSection;
  readonly current: string | undefined;
  readonly shared: SharedParts;
}

export function SectionView({ section, current, shared }: SectionViewProps) {
  const number = sectionNumber(section.path);
  const id = blockId(section.path);
  return (
    <section className="an-section" aria-labelledby={id}>
      <h2 id={id} data-section={section.path}>
        {number !== null && (
          <>
            <span className="an-section-number">{number}</span>{' '}
          </>
        )}
        {section.title}
      </h2>
      {section.path === 'conditions' ? (
        <ConditionsTable blocks={section.blocks} current={current} shared={shared} />
      ) : (
        inRuns(section.blocks).map((run) => <BlockRun key={run[0]?.path} run={run} current={current} shared={shared} />)
      )}
    </section>
  );
}

/** Neighbours of one kind, which may share a table or a list. */
export function inRuns(blocks: readonly Block[]): Block[][] {
  const runs: Block[][] = [];
  for (const block of blocks) {
    const last = runs.at(-1);
    if (last?.[0]?.block === block.block) last.push(block);
    else runs.push([block]);
  }
  return runs;
}

interface BlockRunProps {
  readonly run: readonly Block[];
  readonly current: string | undefined;
  readonly shared: SharedParts;
}

function BlockRun({ run, current, shared }: BlockRunProps) {
  const inputs = run.filter((block): block is InputBlock => block.block === 'input');
  if (inputs.length > 0) return <InputsTable blocks={inputs} current={current} shared={shared} />;
  const statements = run.filter(isStatement);
  if (statements.length > 0) return <Statements blocks={statements} current={current} shared={shared} />;
  return run.map((block) => (
    <OneBlock key={block.path} block={block} isCurrent={block.path === current} shared={shared} />
  ));
}

function isStatement(block: Block): block is StatementBlock {
  return block.block === 'assumption' || block.block === 'exclusion' || block.block === 'reference';
}

interface StatementsProps {
  readonly blocks: readonly StatementBlock[];
  readonly current: string | undefined;
  readonly shared: SharedParts;
}

/** Assumptions, exclusions or references: one statement each, numbered. */
function Statements({ blocks, current, shared }: StatementsProps) {
  return (
    <ol className="an-assumptions">
      {blocks.map((block) => (
        <li key={block.path}>
          <Frame block={block} isCurrent={block.path === current} shared={shared} className="an-assumption">
            <Prose text={block.text} />
          </Frame>
        </li>
      ))}
    </ol>
  );
}

interface OneBlockProps {
  readonly block: Block;
  readonly isCurrent: boolean;
  readonly shared: SharedParts;
}

function OneBlock({ block, isCurrent, shared }: OneBlockProps) {
  switch (block.block) {
    case 'step':
      return <StepView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'check':
      return <CheckView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'gas':
      return <GasView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'text':
      return (
        <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-text">
          <Prose text={block.markdown} />
        </Frame>
      );
    case 'taken':
      return <TakenView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'lookup':
      return <LookupView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'table':
      return <ResultTable block={block} isCurrent={isCurrent} shared={shared} />;
    case 'figure':
      return <FigureView block={block} isCurrent={isCurrent} shared={shared} />;
    case 'input':
    case 'column':
    case 'assumption':
    case 'exclusion':
    case 'reference':
      return null; // set as tables and lists above
  }
}
