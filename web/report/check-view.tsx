import { memo } from 'react';
import type { CheckBlock } from '../../core/report/model.ts';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { StandingWord } from './standing.tsx';
import { Tex } from './tex.tsx';
import { Trace } from './trace.tsx';
import { formatUtilisation, UtilisationBar } from './utilisation.tsx';

/** A check: what must hold, with its numbers; how much of the limit is used, as bar, number and word. */
export const CheckView = memo(function CheckView({ block, isCurrent, shared }: BlockProps<CheckBlock>) {
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-check">
      <div className="an-check-row">
        <div className="an-check-what">
          <div className="an-check-label">{block.label}</div>
          {block.source !== undefined && <div className="an-source">{block.source}</div>}
        </div>
        <UtilisationBar utilisation={block.utilisation} standing={block.standing} />
        <div className="an-check-figure">{formatUtilisation(block.utilisation)}</div>
        <StandingWord standing={block.standing} />
      </div>
      <div className="an-equation an-check-line">
        <Tex tex={block.formula} className="an-link" />
        {block.substituted !== block.formula && <Tex tex={block.substituted} className="an-link an-substituted" />}
      </div>
      {block.at !== undefined && block.points !== undefined && (
        <p className="an-spread">
          governs at {block.at}
          {block.points.failed > 0 && `; fails at ${block.points.failed} of ${block.points.all} points`}
        </p>
      )}
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
      <Trace block={block} blocks={shared.blocks} />
    </Frame>
  );
});
