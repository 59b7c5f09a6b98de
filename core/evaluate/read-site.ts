import { onlyValue } from '../axes/column.ts';
import { error, type Diagnosed, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { SheetDocument, Text } from '../sheet/document.ts';
import { PRESSURE, sameDimension, TEMPERATURE } from '../units/dimensions.ts';
import { NO_SITE, type ReferenceState, type Site } from '../units/site.ts';
import { readAtmosphere, readValue, type TypedValue } from './read-values.ts';

export interface ReadSite {
  readonly site: Site;
  readonly atmosphere: TypedValue | undefined;
  readonly diagnostics: readonly Diagnostic[];
}

/** What the sheet states of its site: the atmosphere behind gauge readings, and the states behind reference volumes. */
export function readSite(document: SheetDocument, units: 'us' | 'si' | undefined): ReadSite {
  const atmosphere = readAtmosphere(document, units);
  const [normal, standard] = [readState(document.normal), readState(document.standard)];
  const site: Site = {
    ...(atmosphere.value === undefined ? {} : { atmosphere: onlyValue(atmosphere.value.column) }),
    ...(normal.value === undefined ? {} : { normal: normal.value }),
    ...(standard.value === undefined ? {} : { standard: standard.value }),
  };
  const diagnostics = [atmosphere, normal, standard].flatMap((part) => part.diagnostics);
  return { site, atmosphere: atmosphere.value, diagnostics };
}

/** The site as far as it is stated at all: where it is stated badly, nothing more is said about what rests on it. */
export function statedSite({ atmosphere, normal, standard }: SheetDocument, site: Site): Site {
  const unknown = { pressure: Number.NaN, temperature: Number.NaN };
  return {
    ...(atmosphere === undefined ? {} : { atmosphere: Number.NaN }),
    ...(normal === undefined ? {} : { normal: unknown }),
    ...(standard === undefined ? {} : { standard: unknown }),
    ...site,
  };
}

/** `1.01325 bara, 0 degC`: an absolute pressure and a temperature. */
function readState(text: Text | undefined): Diagnosed<ReferenceState> {
  if (text === undefined) return { diagnostics: [] };
  const parts = text.text.split(',');
  const [pressure, temperature] = parts.map((part) =>
    readValue({ text: part, span: partSpan(text, part) }, NO_SITE, undefined),
  );
  const diagnostics = [pressure, temperature].flatMap((part) => part?.diagnostics ?? []);
  if (diagnostics.length > 0) return { diagnostics };
  const [p, t] = [pressure?.value, temperature?.value];
  const fits =
    parts.length === 2 &&
    p !== undefined &&
    t !== undefined &&
    sameDimension(p.type.dimension, PRESSURE) &&
    p.type.kind === 'level' &&
    sameDimension(t.type.dimension, TEMPERATURE) &&
    t.type.kind !== 'difference';
  const state = fits ? { pressure: onlyValue(p.column), temperature: onlyValue(t.column) } : undefined;
  if (state !== undefined && state.pressure > 0 && state.temperature > 0) return { value: state, diagnostics };
  return {
    diagnostics: [
      error('QUANTITY_SYNTAX', text.span, 'a reference state is an absolute pressure and a temperature', {
        hints: ['write `1.01325 bara, 0 degC` or `14.696 psia, 60 degF`'],
      }),
    ],
  };
}

function partSpan({ text, span }: Text, part: string): Text['span'] {
  const start = text.indexOf(part);
  return span.end - span.start === text.length
    ? { ...span, start: span.start + start, end: span.start + start + part.length }
    : span;
}
