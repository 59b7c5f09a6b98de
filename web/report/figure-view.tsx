import { memo } from 'react';
import type { FigureBlock } from '../../core/report/model.ts';
import { printNumber } from '../../core/units/print.ts';
import { FigureDrawing } from './figure-drawing.tsx';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { Tex } from './tex.tsx';
import { AlignedNumber, longestTail, PrintedValue, UnitText } from './typeset.tsx';

/** A figure: its drawing, what is greatest in it, and the numbers behind it as a table. */
export const FigureView = memo(function FigureView({ block, isCurrent, shared }: BlockProps<FigureBlock>) {
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-figure-block">
      <figure>
        <figcaption className="an-caption">
          {block.label} <Tex tex={block.formula} />
          {block.unit !== '' && (
            <>
              {' in '}
              <UnitText unit={block.unit} />
            </>
          )}
        </figcaption>
        {block.kind === 'matrix' ? <FigureTable block={block} /> : <FigureDrawing block={block} />}
        <p className="an-spread">
          greatest <PrintedValue printed={block.greatest.printed} /> at {block.greatest.at}
        </p>
        {block.kind !== 'matrix' && (
          <details className="an-trace">
            <summary>
              Numbers<span className="an-hidden"> of {block.label}</span>
            </summary>
            <FigureTable block={block} />
          </details>
        )}
      </figure>
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
    </Frame>
  );
});

/** The same numbers as a table: points of the axis across for a matrix, downwards for what is drawn as a line. */
function FigureTable({ block }: { readonly block: FigureBlock }) {
  const { x, series, limit, kind } = block;
  const xHead = x.unit === undefined ? x.name : `${x.name}, ${x.unit}`;
  const lines = series.map(({ label, values }) => ({ head: label, cells: values.map((value) => printNumber(value)) }));
  if (limit !== undefined) {
    const cells = x.values.map((_, i) => printNumber(limit.values[i] ?? limit.values[0] ?? Number.NaN));
    lines.push({ head: 'limit', cells });
  }
  const points = x.values.map(String);
  const isMatrix = kind === 'matrix';
  const [heads, rows] = isMatrix
    ? [points, lines]
    : [
        lines.map(({ head }) => head),
        points.map((head, i) => ({ head, cells: lines.map(({ cells }) => cells[i] ?? '') })),
      ];
  const tail = longestTail(rows.flatMap(({ cells }) => cells));
  return (
    <div className="an-scroll" tabIndex={0} role="region" aria-label={`Numbers of ${block.label}`}>
      <table className="an-grid">
        <thead>
          <tr>
            <th scope="col">{isMatrix ? `${block.seriesAxis ?? ''} \\ ${xHead}` : xHead}</th>
            {heads.map((head, i) => (
              <th key={i} scope="col">
                {head === '' ? <UnitText unit={block.unit} /> : head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ head, cells }) => (
            <tr key={head}>
              <th scope="row">{head}</th>
              {cells.map((cell, i) => (
                <td key={i}>
                  <AlignedNumber number={cell} tail={tail} />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
