import { renderToStaticMarkup } from 'react-dom/server';
import type { Report } from '../../core/report/model.ts';
import { pageStyle } from './page-style.ts';
import { ReportView } from './report-view.tsx';

/**
 * A report as one HTML file that needs nothing else: no script, no network, and print styles of its own.
 *
 * @param css the bundled report style sheet, fonts inlined
 */
export function renderReportDocument(report: Report, css: string): string {
  const markup = renderToStaticMarkup(
    <html lang="en">
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light dark" />
        <meta name="generator" content={`Antinode ${report.core}`} />
        <title>{`${report.sheet.number} ${report.sheet.title}`}</title>
        <style dangerouslySetInnerHTML={{ __html: withoutEndTag(css) + pageStyle(report) }} />
      </head>
      <body className="an-document">
        <main>
          <ReportView report={report} />
        </main>
      </body>
    </html>,
  );
  return `<!doctype html>\n${markup}\n`;
}

/** Style sheets may hold `</style` in a string; in an HTML file it would end the element. */
function withoutEndTag(css: string): string {
  return css.replaceAll('</', '<\\/');
}
