import { renderDiagnostic } from '../../core/diagnostics/render.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import type { Paint, Streams } from '../terminal.ts';

/** All diagnostics in the human form, and one line that counts them; empty when there are none. */
export function diagnosticsText(diagnostics: readonly LocatedDiagnostic[], paint: Paint): string {
  if (diagnostics.length === 0) return '';
  const painter = {
    error: (text: string) => paint(['red', 'bold'], text),
    warning: (text: string) => paint(['yellow', 'bold'], text),
    info: (text: string) => paint(['blue', 'bold'], text),
    dim: (text: string) => paint('dim', text),
  };
  const rendered = diagnostics.map((diagnostic) => renderDiagnostic(diagnostic, painter));
  return `${[...rendered, countLine(diagnostics)].join('\n\n')}\n`;
}

/** The answer of a command whose sheet is wrong: diagnostics for people on `err`, or for programs on `out`. */
export function writeFaults(
  diagnostics: readonly LocatedDiagnostic[],
  format: 'text' | 'json',
  { streams, paintErr }: { readonly streams: Streams; readonly paintErr: Paint },
): void {
  if (format === 'json') streams.out(`${JSON.stringify({ antinode: 'diagnostics/1', diagnostics }, null, 2)}\n`);
  streams.err(diagnosticsText(diagnostics, paintErr));
}

export function countLine(diagnostics: readonly LocatedDiagnostic[]): string {
  const of = (severity: LocatedDiagnostic['severity']): number =>
    diagnostics.filter((diagnostic) => diagnostic.severity === severity).length;
  return (['error', 'warning'] as const)
    .filter((severity) => of(severity) > 0)
    .map((severity) => count(of(severity), severity))
    .join(', ');
}

export function count(n: number, noun: string): string {
  return `${n} ${noun}${n === 1 ? '' : 's'}`;
}
