import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { AlignedNumber, longestTail, numberParts, PrintedValue, UnitText } from '../../../web/report/typeset.tsx';

const MINUS = '\u2212';

describe('numberParts', () => {
  it('splits on the decimal sign and sets minus signs', () => {
    expect(numberParts('-12.50')).toEqual({ whole: `${MINUS}12`, fraction: '.50', power: null });
    expect(numberParts('1.05e-6')).toEqual({ whole: '1', fraction: '.05', power: `${MINUS}6` });
    expect(numberParts('2e+07')).toEqual({ whole: '2', fraction: '', power: '07' });
  });

  it('keeps feet, inches and fractions as they are written', () => {
    expect(numberParts('5 ft 3-1/2')).toEqual({ whole: '5 ft 3-1/2', fraction: '', power: null });
    expect(numberParts('-3/4').whole).toBe(`${MINUS}3/4`);
  });
});

describe('AlignedNumber', () => {
  it('gives every number of a column the same tail', () => {
    const numbers = ['905', '0.54', '13.9'];
    expect(longestTail(numbers)).toBe(3);
    for (const number of numbers) {
      expect(renderToStaticMarkup(<AlignedNumber number={number} tail={3} />)).toContain('min-width:3ch');
    }
  });
});

describe('units', () => {
  it('raises powers and knows the signs of degrees', () => {
    expect(renderToStaticMarkup(<UnitText unit="kg/m^3" />)).toBe('<span class="an-unit">kg/m<sup>3</sup></span>');
    expect(renderToStaticMarkup(<UnitText unit="J/(kg*K)" />)).toBe('<span class="an-unit">J/(kg·K)</span>');
    expect(renderToStaticMarkup(<UnitText unit="degF" />)).toBe('<span class="an-unit">°F</span>');
    expect(renderToStaticMarkup(<UnitText unit="s^-2" />)).toBe(`<span class="an-unit">s<sup>${MINUS}2</sup></span>`);
  });

  it('never shows a power as e', () => {
    const html = renderToStaticMarkup(<PrintedValue printed={{ number: '-1.5e-6', unit: '1/K', tex: '' }} />);
    expect(html).toContain(`${MINUS}1.5\u2009×\u200910<sup>${MINUS}6</sup>`);
    expect(html).not.toMatch(/\de/);
  });
});
