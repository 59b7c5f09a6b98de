import { useState } from 'react';
import type { Quantity, ReportAxis } from '../../core/report/model.ts';
import { printNumber } from '../../core/units/print.ts';
import { AlignedNumber, longestTail, UnitText } from './typeset.tsx';

/** More columns than this are a file for a machine, and no table for a reader. */
const MOST_COLUMNS = 24;
const MOST_ROWS = 400;

/** A file runs no script that could make the table when it is opened: what is small enough stands in it from the start. */
const IS_FILE = typeof document === 'undefined';
const MOST_CELLS_IN_FILE = 800;

/**
 * All values of a quantity over its axes, on demand: the outermost axis downwards, the next one across. Of a third axis
 * the largest magnitude is shown, and said to be.
 */
export function WholeTable({ quantity }: { readonly quantity: Quantity }) {
  const [isOpen, setOpen] = useState(false);
  const { axes, label, value } = quantity;
  if (axes.length === 0 || typeof value === 'number') return null;
  const isSmall = axes.reduce((cells, axis) => cells * axis.values.length, 1) <= MOST_CELLS_IN_FILE;
  if (IS_FILE && !isSmall) return null;
  return (
    <details className="an-trace an-whole" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>
        All values<span className="an-hidden"> of {label}</span>
      </summary>
      {(isOpen || IS_FILE) && <Values quantity={quantity} />}
    </details>
  );
}

function Values({ quantity: { axes, value, unit, label } }: { readonly quantity: Quantity }) {
  const [rows, columns, ...more] = axes;
  if (rows === undefined || typeof value === 'number') return null;
  const shownColumns = (columns?.values ?? ['']).slice(0, MOST_COLUMNS);
  const cells = value
    .slice(0, MOST_ROWS)
    .map((row) => shownColumns.map((_, i) => printNumber(typeof row === 'number' ? row : largest(row[i]))));
  const tail = longestTail(cells.flat());
  const left = (columns?.values.length ?? 1) - shownColumns.length;
  return (
    <>
      <div className="an-scroll" tabIndex={0} role="region" aria-label={`All values of ${label}`}>
        <table className="an-grid">
          <thead>
            <tr>
              <th scope="col">
                <AxisHead axis={rows} />
                {columns !== undefined && (
                  <>
                    {' '}
                    \ <AxisHead axis={columns} />
                  </>
                )}
              </th>
              {shownColumns.map((point) => (
                <th key={point} scope="col">
                  {columns === undefined ? <UnitText unit={unit} /> : point}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {cells.map((row, i) => (
              <tr key={rows.values[i]}>
                <th scope="row">{rows.values[i]}</th>
                {row.map((cell, j) => (
                  <td key={j}>
                    <AlignedNumber number={cell} tail={tail} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="an-note">
        in <UnitText unit={unit} />
        {more.length > 0 && `; the largest over ${more.map(({ name }) => name).join(' and ')}`}
        {left > 0 && `; ${left} more columns in the machine form of the report`}
      </p>
    </>
  );
}

function AxisHead({ axis: { name, unit } }: { readonly axis: ReportAxis }) {
  return (
    <>
      {name}
      {unit !== undefined && (
        <>
          , <UnitText unit={unit} />
        </>
      )}
    </>
  );
}

/** The value of largest magnitude among nested ones. */
function largest(value: Quantity['value'] | undefined): number {
  if (value === undefined) return Number.NaN;
  if (typeof value === 'number') return value;
  return value.map(largest).reduce((most, each) => (Math.abs(each) > Math.abs(most) ? each : most), 0);
}
