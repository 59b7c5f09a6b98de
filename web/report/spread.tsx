import type { Expectation, Extreme } from '../../core/report/model.ts';
import { PrintedValue } from './typeset.tsx';

interface SpreadProps {
  readonly extent: { readonly least: Extreme; readonly greatest: Extreme };
}

/** Of values over axes: the least and the greatest, and where they are. */
export function Spread({ extent: { least, greatest } }: SpreadProps) {
  return (
    <p className="an-spread">
      least <PrintedValue printed={least.printed} /> at {least.at}; greatest <PrintedValue printed={greatest.printed} />{' '}
      at {greatest.at}
    </p>
  );
}

/** The range in which the value would be believed. Outside of it, a sign and words ask the reader to look twice. */
export function Expected({ expect: { range, within } }: { readonly expect: Expectation }) {
  if (within) return <span className="an-expected">expected {range}</span>;
  return (
    <span className="an-expected an-standing an-unexpected">
      <span aria-hidden="true">△</span> outside of what is expected: {range}
    </span>
  );
}
