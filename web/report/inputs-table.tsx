import { memo } from 'react';
import type { InputBlock } from '../../core/report/model.ts';
import { Aside, blockAttributes } from './frame.tsx';
import type { BlockProps, SharedParts } from './shared.ts';
import { Expected } from './spread.tsx';
import { HoldWord } from './standing.tsx';
import { Tex } from './tex.tsx';
import { AlignedNumber, longestTail, UnitText } from './typeset.tsx';

/** The one input that is no name of the sheet: a sheet states its atmosphere and has nowhere to give a source for it. */
const ATMOSPHERE = 'atmosphere';

interface InputsTableProps {
  readonly blocks: readonly InputBlock[];
  readonly current: string | undefined;
  readonly shared: SharedParts;
}

export function InputsTable({ blocks, current, shared }: InputsTableProps) {
  const tail = longestTail(blocks.map((block) => block.printed.number));
  return (
    <table className="an-table an-inputs">
      <thead>
        <tr>
          <th scope="col">Input</th>
          <th scope="col">
            <span className="an-hidden">Symbol</span>
          </th>
          <th scope="col" className="an-column-value">
            Value
          </th>
          <th scope="col">
            <span className="an-hidden">Unit</span>
          </th>
          <th scope="col">Source</th>
        </tr>
      </thead>
      <tbody>
        {blocks.map((block) => (
          <InputRow key={block.path} block={block} isCurrent={block.path === current} shared={shared} tail={tail} />
        ))}
      </tbody>
    </table>
  );
}

interface InputRowProps extends BlockProps<InputBlock> {
  readonly tail: number;
}

const InputRow = memo(function InputRow({ block, isCurrent, shared, tail }: InputRowProps) {
  return (
    <tr {...blockAttributes(block, isCurrent, 'an-input')}>
      <th scope="row">
        <Aside block={block} shared={shared} />
        {block.label}
        {block.note !== undefined && <span className="an-note">{block.note}</span>}
        {block.expect !== undefined && (
          <span className="an-note">
            <Expected expect={block.expect} />
          </span>
        )}
      </th>
      <td className="an-column-symbol">
        <Tex tex={block.symbol} />
      </td>
      <td className="an-column-value">
        <AlignedNumber number={block.printed.number} tail={tail} />
        {block.tolerance !== undefined && <span className="an-tolerance">{block.tolerance}</span>}
      </td>
      <td className="an-column-unit">
        <UnitText unit={block.printed.unit} />
      </td>
      <td className="an-column-source">
        <InputSource block={block} />
      </td>
    </tr>
  );
});

/** Where the value comes from. One that has neither source nor hold says so: a checker must not overlook it. */
function InputSource({ block }: { readonly block: InputBlock }) {
  if (block.path === ATMOSPHERE) return <span className="an-label">as this sheet states</span>;
  return (
    <>
      {block.hold !== undefined && (
        <>
          <HoldWord /> <span className="an-hold-reason">{block.hold}</span>
        </>
      )}
      {block.hold !== undefined && block.source !== undefined && <br />}
      {block.source}
      {block.hold === undefined && block.source === undefined && <span className="an-unsourced">no source given</span>}
    </>
  );
}
