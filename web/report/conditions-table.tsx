import type { Block, ColumnBlock, InputBlock } from '../../core/report/model.ts';
import { Aside, blockAttributes } from './frame.tsx';
import type { SharedParts } from './shared.ts';
import { HoldWord } from './standing.tsx';
import { Tex } from './tex.tsx';
import { AlignedNumber, longestTail, UnitText } from './typeset.tsx';

type Column = InputBlock | ColumnBlock;

interface ConditionsTableProps {
  readonly blocks: readonly Block[];
  readonly current: string | undefined;
  readonly shared: SharedParts;
}

/** The operating conditions: one row each, and a column for every block, so that a column can be ticked and remarked on. */
export function ConditionsTable({ blocks, current, shared }: ConditionsTableProps) {
  const columns = blocks.filter((block): block is Column => block.block === 'input' || block.block === 'column');
  const ids = shared.axes.find(({ name }) => name === 'condition')?.values ?? [];
  const tails = columns.map((column) => longestTail(column.cells ?? []));
  return (
    <>
      <div className="an-scroll" tabIndex={0} role="region" aria-label="Table of operating conditions">
        <table className="an-grid an-conditions">
          <thead>
            <tr>
              <th scope="col">
                <span className="an-hidden">Condition</span>
              </th>
              {columns.map((column) => (
                <th
                  key={column.path}
                  scope="col"
                  {...blockAttributes(column, column.path === current, headClass(column))}
                >
                  <Head column={column} />
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {ids.map((id, row) => (
              <tr key={id}>
                <th scope="row">{id}</th>
                {columns.map((column, i) => (
                  <td key={column.path} className={column.block === 'column' ? 'an-words' : ''}>
                    <Cell column={column} row={row} tail={tails[i] ?? 0} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <ul className="an-legend">
        {columns.map((column) => (
          <LegendLine key={column.path} column={column} shared={shared} />
        ))}
      </ul>
    </>
  );
}

function headClass({ block }: Column): string {
  return block === 'column' ? 'an-condition an-words' : 'an-condition';
}

function Head({ column }: { readonly column: Column }) {
  if (column.block === 'column') return <>{column.label}</>;
  return (
    <>
      <Tex tex={column.symbol} />
      {column.printed.unit !== '' && (
        <>
          <br />
          <UnitText unit={column.printed.unit} />
        </>
      )}
    </>
  );
}

function Cell({ column, row, tail }: { readonly column: Column; readonly row: number; readonly tail: number }) {
  const cell = column.cells?.[row] ?? '';
  return column.block === 'column' ? cell : <AlignedNumber number={cell} tail={tail} />;
}

/** The name in formulas, where the label does not say it already. */
function ColumnName({ column: { name, label } }: { readonly column: ColumnBlock }) {
  return name.toLowerCase() === label.toLowerCase() ? null : <em>{name}</em>;
}

/** What a column is and where it comes from: its head has room for a symbol only. */
function LegendLine({ column, shared }: { readonly column: Column; readonly shared: SharedParts }) {
  return (
    <li>
      <Aside block={column} shared={shared} />
      {column.block === 'input' ? <Tex tex={column.symbol} /> : <ColumnName column={column} />} {column.label}
      <span className="an-source">
        {' · '}
        {column.hold !== undefined && (
          <>
            <HoldWord /> <span className="an-hold-reason">{column.hold}</span>
          </>
        )}
        {column.source ?? (column.hold === undefined ? 'no source given' : '')}
      </span>
      {column.note !== undefined && <span className="an-note">{column.note}</span>}
    </li>
  );
}
