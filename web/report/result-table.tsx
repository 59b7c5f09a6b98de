import { memo } from 'react';
import type { TableBlock } from '../../core/report/model.ts';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { Tex } from './tex.tsx';
import { AlignedNumber, longestTail, UnitText } from './typeset.tsx';

/** Quantities side by side, row by row along their axis. */
export const ResultTable = memo(function ResultTable({ block, isCurrent, shared }: BlockProps<TableBlock>) {
  const { columns, rows, axis } = block;
  const tails = columns.map((_, i) => longestTail(rows.map(({ cells }) => cells[i] ?? '')));
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-table-block">
      <div className="an-caption">{block.label}</div>
      <div className="an-scroll" tabIndex={0} role="region" aria-label={block.label}>
        <table className="an-grid">
          <thead>
            <tr>
              {axis !== undefined && (
                <th scope="col">
                  <span className="an-hidden">{axis}</span>
                </th>
              )}
              {columns.map(({ name, label, symbol, unit }) => (
                <th key={name} scope="col" title={label}>
                  <Tex tex={symbol} />
                  {unit !== '' && (
                    <>
                      <br />
                      <UnitText unit={unit} />
                    </>
                  )}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ at, cells }) => (
              <tr key={at}>
                {axis !== undefined && <th scope="row">{at}</th>}
                {cells.map((cell, i) => (
                  <td key={i}>
                    <AlignedNumber number={cell} tail={tails[i] ?? 0} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
    </Frame>
  );
});
