import { describe, expect, it } from 'vitest';
import { pageStyle } from '../../../web/report/page-style.ts';
import { renderReportDocument } from '../../../web/report/render-document.tsx';
import { sampleReport } from '../fixtures/report.ts';

describe('renderReportDocument', () => {
  const html = renderReportDocument(sampleReport(), '.x{color:red}');

  it('is one whole document with title, language and its styles', () => {
    expect(html).toMatch(/^<!doctype html>\n<html lang="en">/);
    expect(html).toContain('<title>TH3-C-104 Second-stage discharge lateral, shaking force</title>');
    expect(html).toContain('<style>.x{color:red}@page');
    expect(html).toContain('<math');
  });

  it('runs no script and asks for nothing', () => {
    const parsed = new DOMParser().parseFromString(html, 'text/html');
    expect(parsed.querySelectorAll('script, link, img, iframe')).toHaveLength(0);
    expect([...parsed.querySelectorAll('a')].every((link) => link.getAttribute('href')?.startsWith('#'))).toBe(true);
  });

  it('has a target for each of its links', () => {
    const parsed = new DOMParser().parseFromString(html, 'text/html');
    for (const link of parsed.querySelectorAll('a')) {
      expect(parsed.getElementById(link.getAttribute('href')?.slice(1) ?? ''), link.outerHTML).not.toBeNull();
    }
  });

  it('lets no title and no style sheet end the style element', () => {
    const report = sampleReport();
    const hostile = { ...report, sheet: { ...report.sheet, title: '</style><script>alert(1)</script>"}' } };
    const parsed = new DOMParser().parseFromString(
      renderReportDocument(hostile, 'a::before{content:"</style>"}'),
      'text/html',
    );
    expect(parsed.querySelectorAll('style')).toHaveLength(1);
    expect(parsed.querySelector('script')).toBeNull();
    expect(pageStyle(hostile)).not.toContain('<');
  });
});
