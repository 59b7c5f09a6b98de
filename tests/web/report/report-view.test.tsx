import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { blockId } from '../../../web/report/block-id.ts';
import { ReportView } from '../../../web/report/report-view.tsx';
import { failingReport, FORCE_CHECK, sampleReport } from '../fixtures/report.ts';

afterEach(cleanup);

describe('ReportView', () => {
  it('gives every block an id and its path, so that links and the margin find it', () => {
    const report = sampleReport();
    const { container } = render(<ReportView report={report} />);
    for (const block of report.sections.flatMap((section) => section.blocks)) {
      expect(container.querySelector(`[data-path="${block.path}"]`)?.id, block.path).toBe(blockId(block.path));
    }
  });

  it('shows holds before the first section, each linked to its input', () => {
    const { container } = render(<ReportView report={sampleReport()} />);
    const banner = screen.getByRole('complementary', { name: 'Open holds' });
    const link = within(banner).getByRole('link');
    expect(link.getAttribute('href')).toBe('#inputs-dp_m');
    const firstSection = container.querySelector('.an-section');
    expect(
      firstSection !== null && banner.compareDocumentPosition(firstSection) & Node.DOCUMENT_POSITION_FOLLOWING,
    ).toBeTruthy();
  });

  it('has a banner of failed checks only when a check fails', () => {
    const { rerender } = render(<ReportView report={sampleReport()} />);
    expect(screen.queryByRole('complementary', { name: 'Failed checks' })).toBeNull();
    rerender(<ReportView report={failingReport()} />);
    expect(screen.getByRole('complementary', { name: 'Failed checks' }).textContent).toContain('utilisation 1.05');
  });

  it('tells how each check stands by word and sign, and its utilisation as a number', () => {
    const { container } = render(<ReportView report={failingReport()} />);
    const over = container.querySelector(`[data-path="${FORCE_CHECK}"]`);
    expect(over?.querySelector('.an-standing')?.textContent).toBe('▲ over');
    expect(over?.querySelector('.an-check-figure')?.textContent).toBe('1.05');
    const within = container.querySelector('[data-path="sections/4/checks/2"]');
    expect(within?.querySelector('.an-standing')?.textContent).toBe('● within');
  });

  it('sets formulas with MathML beside the glyphs', () => {
    const { container } = render(<ReportView report={sampleReport()} />);
    const force = container.querySelector('[data-path="sections/3/steps/F"]');
    expect(force?.querySelectorAll('.an-equation math')).toHaveLength(3);
    expect(force?.querySelector('.an-result annotation')?.textContent).toContain('574.9');
  });

  it('says when an input has neither source nor hold', () => {
    const { container } = render(<ReportView report={sampleReport()} />);
    expect(container.querySelector('[data-path="inputs/x_f"]')?.textContent).toContain('no source given');
    expect(container.querySelector('[data-path="inputs/p_d"]')?.textContent).not.toContain('no source given');
  });

  it('carries cautions, references and warnings at its foot', () => {
    const report = sampleReport();
    const { container } = render(<ReportView report={report} />);
    for (const caution of report.cautions) expect(container.textContent).toContain(caution);
    for (const source of report.sources)
      expect(container.querySelector('.an-references')?.textContent).toContain(source.text);
    expect(container.querySelector('.an-warnings')?.textContent).toContain('SOURCE_MISSING');
  });

  it('numbers the sections as their paths do, and the basis not at all', () => {
    render(<ReportView report={sampleReport()} />);
    expect(screen.getByRole('heading', { name: '3 Force on run 3' })).toBeDefined();
    expect(screen.getByRole('heading', { name: 'Basis and inputs' })).toBeDefined();
  });

  it('tells which block is chosen, by a press anywhere in it, and shows the current one', () => {
    const onSelect = vi.fn();
    const { container } = render(
      <ReportView report={sampleReport()} current="sections/3/steps/A" onSelect={onSelect} />,
    );
    expect(container.querySelector('[aria-current="true"]')?.getAttribute('data-path')).toBe('sections/3/steps/A');
    const label = within(container.querySelector<HTMLElement>('[data-path="inputs/p_d"]') ?? container).getByText(
      'Discharge pressure',
    );
    fireEvent.click(label);
    expect(onSelect).toHaveBeenCalledExactlyOnceWith('inputs/p_d');
  });

  it('draws what it is given beside each block', () => {
    const report = sampleReport();
    const { container } = render(<ReportView report={report} renderAside={(block) => <i>{block.path}</i>} />);
    expect([...container.querySelectorAll('.an-aside')].map((aside) => aside.textContent)).toEqual(
      report.sections.flatMap((section) => section.blocks).map((block) => block.path),
    );
  });

  it('opens the trace of a block back to its inputs', () => {
    const { container } = render(<ReportView report={sampleReport()} />);
    const force = container.querySelector('[data-path="sections/3/steps/F"]');
    const trace = force?.querySelector('details');
    expect(trace?.querySelectorAll('li')).toHaveLength(2);
    if (trace) {
      trace.open = true;
      fireEvent(trace, new Event('toggle'));
    }
    const hrefs = [...(trace?.querySelectorAll('a') ?? [])].map((link) => link.getAttribute('href'));
    expect(hrefs).toContain('#inputs-dp_m');
    expect(trace?.textContent).toContain('discharge-run-force.yaml:');
    expect(trace?.textContent).toContain('hold');
  });
});
