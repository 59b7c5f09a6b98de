import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import type { Report } from '../../../core/report/model.ts';
import { blockId } from '../../../web/report/block-id.ts';
import { ReportView } from '../../../web/report/report-view.tsx';
import { evaluateText, reportOf, sheetOf } from '../../core/evaluate/sheet-text.ts';

afterEach(cleanup);

const SHEET = sheetOf(
  'exclusions: [Valve flutter]',
  'references: [Another sheet]',
  'conditions:',
  '  columns: { q: { unit: psi, label: Pulsation, hold: Awaiting the vendor }, load: { unit: text, source: b } }',
  '  rows: { C1: [1.5, all], C2: [20, half] }',
  'inputs:',
  '  N: { value: 600..1200 rpm step 200 rpm, label: Speed, source: b }',
  '  A: { value: 10 in^2, source: b, tolerance: 2 %, expect: 20..30 in^2 }',
  'tables: { k: { columns: { x: "1", y: mm }, rows: [[1, 10.5], [2, 9]], source: b, label: Stroke } }',
  'sections:',
  '  - title: Force',
  '    text: "It is {{ F }}."',
  '    steps:',
  '      F: { calc: q*A, unit: lbf, expect: 1..50 lbf }',
  '      G: where(N <= 800 rpm, F, 0 lbf)',
  '    tables: [{ of: [q, F], title: Side by side }]',
  '    figures:',
  '      - { kind: line, of: G, limit: 100 lbf, title: Over speed }',
  '      - { kind: matrix, of: G, title: As a matrix }',
  '    checks:',
  '      - { that: G <= 100 lbf, label: Force over speed }',
);

const report: Report = reportOf(evaluateText(SHEET));

function block(container: HTMLElement, path: string): HTMLElement {
  const found = container.querySelector<HTMLElement>(`[data-path="${path}"]`);
  if (found === null) throw new Error(`no ${path}`);
  return found;
}

describe('a report over axes', () => {
  it('gives every block an element of its own', () => {
    const { container } = render(<ReportView report={report} />);
    for (const { path } of report.sections.flatMap(({ blocks }) => blocks))
      expect(block(container, path).id).toBe(blockId(path));
  });

  it('sets the operating conditions as one table, each column a block, with its hold', () => {
    const { container } = render(<ReportView report={report} />);
    const table = within(screen.getByRole('region', { name: 'Table of operating conditions' }));
    const rows = table.getAllByRole('row').map((row) => row.textContent);
    expect(rows.slice(1)).toEqual(['C11.5all', 'C220half']);
    expect(block(container, 'conditions/q').tagName).toBe('TH');
    expect(container.querySelector('.an-legend')?.textContent).toContain('Awaiting the vendor');
    expect(screen.getByRole('complementary', { name: 'Open holds' }).textContent).toContain('Pulsation');
  });

  it('says of a step its least and greatest, the case put in, and what was expected', () => {
    const { container } = render(<ReportView report={report} />);
    const step = block(container, 'sections/1/steps/F');
    expect(step.querySelector('.an-spread')?.textContent).toBe(
      'least 15.00\u2009lbf at C1; greatest 200.0\u2009lbf at C2',
    );
    expect(step.querySelector('.an-case-word')?.textContent).toBe('at C2');
    expect(step.querySelector('.an-unexpected')?.textContent).toContain('outside of what is expected: 1..50 lbf');
  });

  it('shows all values on demand, by condition and speed', () => {
    const { container } = render(<ReportView report={report} />);
    const whole = block(container, 'sections/1/steps/G').querySelector<HTMLDetailsElement>('details.an-whole');
    expect(whole?.querySelector('table')).toBeNull();
    if (whole !== null) {
      whole.open = true;
      fireEvent(whole, new Event('toggle'));
    }
    const rows = [...(whole?.querySelectorAll('tbody tr') ?? [])].map((row) => row.textContent);
    expect(rows).toEqual(['C115.0015.0000', 'C2200.0200.000']);
  });

  it('names the governing point of a check, and counts the failures', () => {
    const { container } = render(<ReportView report={report} />);
    expect(block(container, 'sections/1/checks/1').querySelector('.an-spread')?.textContent).toBe(
      'governs at C2, 600 rpm; fails at 2 of 8 points',
    );
  });

  it('draws a figure with its limit, and has its numbers as a table', () => {
    const { container } = render(<ReportView report={report} />);
    const figure = block(container, 'sections/1/figures/1');
    expect(within(figure).getByRole('img', { name: 'Over speed: lbf over speed, rpm' })).toBeTruthy();
    expect(figure.querySelectorAll('.an-drawing-line')).toHaveLength(2);
    expect(figure.querySelector('.an-drawing-limit')).not.toBeNull();
    const heads = [...figure.querySelectorAll('thead th')].map((head) => head.textContent);
    expect(heads).toEqual(['speed, rpm', 'C1', 'C2', 'limit']);
  });

  it('sets a matrix and a table of results as tables', () => {
    const { container } = render(<ReportView report={report} />);
    const matrix = block(container, 'sections/1/figures/2');
    expect([...matrix.querySelectorAll('thead th')].map((head) => head.textContent)).toEqual([
      'condition \\ speed, rpm',
      '600',
      '800',
      '1000',
      '1200',
    ]);
    const rows = [...block(container, 'sections/1/tables/1').querySelectorAll('tbody tr')].map(
      (row) => row.textContent,
    );
    expect(rows).toEqual(['C11.515.00', 'C220200.0']);
  });

  it('lists exclusions and references, and shows a table of the sheet', () => {
    const { container } = render(<ReportView report={report} />);
    expect(block(container, 'exclusions/1').textContent).toContain('Valve flutter');
    expect(block(container, 'references/1').textContent).toContain('Another sheet');
    expect(block(container, 'tables/k').querySelectorAll('tbody tr')).toHaveLength(2);
    expect(block(container, 'inputs/A').textContent).toContain('± 2 %');
  });

  it('puts values in the place of their names in prose', () => {
    const { container } = render(<ReportView report={report} />);
    expect(block(container, 'sections/1/text').textContent).toContain('It is 15.00 to 200.0\u00A0lbf.');
  });
});
