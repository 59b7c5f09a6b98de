import { DIAGNOSTIC_CODES, type DiagnosticCode } from '../../core/diagnostics/codes.ts';
import type { LocatedDiagnostic } from '../../core/report/model.ts';
import { CORE_VERSION } from '../../core/version.ts';

const CODES = Object.keys(DIAGNOSTIC_CODES) as readonly DiagnosticCode[];

const LEVELS = { error: 'error', warning: 'warning', info: 'note' } as const;

/**
 * Diagnostics in the form that code review systems read.
 * Source: OASIS SARIF version 2.1.0 (2020), sections 3.13, 3.14, 3.27, 3.29, 3.30.
 */
export function sarif(diagnostics: readonly LocatedDiagnostic[]): string {
  const log = {
    $schema: 'https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json',
    version: '2.1.0',
    runs: [
      {
        tool: { driver: { name: 'Antinode', version: CORE_VERSION, rules: CODES.map(rule) } },
        columnKind: 'utf16CodeUnits',
        results: diagnostics.map(result),
      },
    ],
  };
  return `${JSON.stringify(log, null, 2)}\n`;
}

function rule(code: DiagnosticCode): unknown {
  return { id: code, shortDescription: { text: DIAGNOSTIC_CODES[code] } };
}

function result({ code, severity, message, hints, labels, file, line, column, length }: LocatedDiagnostic): unknown {
  const related = labels.map((label, i) => ({
    id: i,
    message: { text: label.text },
    physicalLocation: {
      artifactLocation: { uri: uriOf(label.file) },
      region: { startLine: label.line, startColumn: label.column },
    },
  }));
  return {
    ruleId: code,
    ruleIndex: CODES.indexOf(code),
    level: LEVELS[severity],
    message: { text: [message, ...hints.map((hint) => `hint: ${hint}`)].join('\n') },
    locations: [
      {
        physicalLocation: {
          artifactLocation: { uri: uriOf(file) },
          region: { startLine: line, startColumn: column, endLine: line, endColumn: column + length },
        },
      },
    ],
    ...(related.length === 0 ? {} : { relatedLocations: related }),
  };
}

/** A relative reference: parts of the path escaped, slashes kept (RFC 3986). */
function uriOf(file: string): string {
  return file.replaceAll('\\', '/').split('/').map(encodeURIComponent).join('/');
}
