import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import type { Site } from './site.ts';
import type { Unit } from './unit.ts';

const EXAMPLES = { normal: '1.01325 bara, 0 degC', standard: '14.696 psia, 60 degF' } as const;

/** A unit rests on a state that the sheet does not state. */
export function missingState(missing: keyof Site, { text }: Unit, span: Span): Diagnostic {
  if (missing === 'atmosphere') {
    return error('ATMOSPHERE_MISSING', span, `\`${text}\` is a gauge pressure, and the sheet states no atmosphere`, {
      hints: ['add `atmosphere: 14.696 psia` (the pressure at your site) at the top of the sheet'],
    });
  }
  return error(
    'REFERENCE_MISSING',
    span,
    `\`${text}\` counts ${missing} volumes, and the sheet states no ${missing} state`,
    {
      hints: [`add \`${missing}_state: ${EXAMPLES[missing]}\` (that of your contract) at the top of the sheet`],
    },
  );
}
