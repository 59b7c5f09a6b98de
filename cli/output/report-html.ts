import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { Report } from '../../core/report/model.ts';
import { renderReportDocument } from '../../web/report/render-document.tsx';
import { CommandFailure, EXIT } from '../exit-status.ts';

/** The stylesheet with fonts inlined stands beside the bundle; from source, the build has put it into `dist`. */
const STYLESHEETS = ['../report/report.css', '../../dist/report/report.css'];

/** One self-contained file, drawn by the components that the viewer uses. */
export async function reportHtml(report: Report): Promise<string> {
  return renderReportDocument(report, await stylesheet());
}

async function stylesheet(): Promise<string> {
  for (const path of STYLESHEETS) {
    const css = await readFile(fileURLToPath(new URL(path, import.meta.url)), 'utf8').catch(() => null);
    if (css !== null) return css;
  }
  throw new CommandFailure(EXIT.bug, 'the report stylesheet is missing', ['run `npm run build`']);
}
