import { memo } from 'react';
import type { LookupBlock, TakenBlock } from '../../core/report/model.ts';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { Spread } from './spread.tsx';
import { Tex } from './tex.tsx';
import { AlignedNumber, longestTail, UnitText } from './typeset.tsx';
import { WholeTable } from './whole-table.tsx';

/** A value of another sheet's revision, with the revision that it is pinned to. */
export const TakenView = memo(function TakenView({ block, isCurrent, shared }: BlockProps<TakenBlock>) {
  const quantity = shared.quantities[block.name];
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-step">
      <div className="an-step-head">
        <span className="an-label">{block.label === block.name ? '' : block.label}</span>
        <span className="an-source">
          from <strong>{block.from}</strong>
        </span>
      </div>
      <div className="an-equation">
        <Tex tex={`${block.symbol} = ${block.printed.tex}`} className="an-link an-result" />
      </div>
      {block.extent !== undefined && <Spread extent={block.extent} />}
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
      <p className="an-note">
        revision <code>{block.revision.replace('sha256-', '').slice(0, 12)}</code>
      </p>
      {quantity !== undefined && <WholeTable quantity={quantity} />}
    </Frame>
  );
});

/** A table of the sheet that formulas interpolate in. */
export const LookupView = memo(function LookupView({ block, isCurrent, shared }: BlockProps<LookupBlock>) {
  const tails = block.columns.map((_, i) => longestTail(block.rows.map((row) => row[i] ?? '')));
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-gas">
      <div className="an-step-head">
        <span className="an-gas-name">
          <strong>{block.label}</strong> <Tex tex={block.symbol} />
        </span>
        {block.source !== undefined && <span className="an-source">{block.source}</span>}
      </div>
      <table className="an-grid">
        <caption className="an-hidden">{block.label}</caption>
        <thead>
          <tr>
            {block.columns.map(({ name, unit }) => (
              <th key={name} scope="col">
                {name}
                {unit !== '' && (
                  <>
                    , <UnitText unit={unit} />
                  </>
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {block.rows.map((row, i) => (
            <tr key={i}>
              {row.map((cell, j) => (
                <td key={j}>
                  <AlignedNumber number={cell} tail={tails[j] ?? 0} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
    </Frame>
  );
});
