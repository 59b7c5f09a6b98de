import { memo } from 'react';
import type { GasBlock } from '../../core/report/model.ts';
import { Frame } from './frame.tsx';
import type { BlockProps } from './shared.ts';
import { AlignedNumber, longestTail } from './typeset.tsx';

const METHODS: Readonly<Record<string, string>> = {
  ideal: 'ideal gas',
  gerg2008: 'GERG-2008',
  aga8_detail: 'AGA8 Detail',
  peng_robinson: 'Peng–Robinson',
  soave_redlich_kwong: 'Soave–Redlich–Kwong',
};

/** `n_butane` reads n-butane, `carbon_dioxide` carbon dioxide. */
export function componentName(component: string): string {
  return component.replace(/^n_/, 'n-').replaceAll('_', ' ');
}

/** A gas: its method and source, and its composition in mole percent. */
export const GasView = memo(function GasView({ block, isCurrent, shared }: BlockProps<GasBlock>) {
  const tail = longestTail(block.fractions.map(({ percent }) => percent));
  return (
    <Frame block={block} isCurrent={isCurrent} shared={shared} className="an-gas">
      <div className="an-step-head">
        <span className="an-gas-name">
          <strong>{block.label}</strong> <span className="an-label">{METHODS[block.method] ?? block.method}</span>
        </span>
        {block.source !== undefined && <span className="an-source">{block.source}</span>}
      </div>
      <table className="an-fractions">
        <caption className="an-hidden">Composition of {block.label}, mole percent</caption>
        <tbody>
          {block.fractions.map(({ component, percent, tolerance }) => (
            <tr key={component}>
              <th scope="row">{componentName(component)}</th>
              <td>
                <AlignedNumber number={percent} tail={tail} />
                <span className="an-unit">{'\u2009'}%</span>
                {tolerance !== undefined && <span className="an-tolerance">{tolerance}</span>}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {block.note !== undefined && <p className="an-note">{block.note}</p>}
    </Frame>
  );
});
