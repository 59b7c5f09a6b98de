import { error, warning, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { SheetDocument, Text } from './document.ts';
import { LIMITS } from './limits.ts';

/** What the schema cannot say: names that are defined twice, sources that are not listed, inputs without an origin. */
export function checkNames(document: SheetDocument): Diagnostic[] {
  return [
    ...tooMany(document),
    ...duplicates(namedNodes(document)),
    ...duplicates(document.sources.map(({ id }) => id)),
    ...unknownSources(document),
    ...withoutOrigin(document),
  ];
}

function tooMany({ inputs, sections, number }: SheetDocument): Diagnostic[] {
  const names = inputs.length + sections.reduce((sum, { steps }) => sum + steps.length, 0);
  if (names <= LIMITS.names) return [];
  const message = `the sheet has ${names} inputs and steps, more than ${LIMITS.names}`;
  return [error('LIMIT_EXCEEDED', number.span, message, { hints: ['split the sheet'] })];
}

/** Gases, tables, inputs and steps share one space of names, since formulas use them all alike. */
function namedNodes({ gases, lookups, take, inputs, conditions, sections }: SheetDocument): Text[] {
  const columns = conditions?.columns ?? [];
  const steps = sections.flatMap((section) => section.steps);
  return [...gases, ...lookups, ...take, ...inputs, ...columns, ...steps].map(({ name }) => name);
}

function duplicates(named: readonly Text[]): Diagnostic[] {
  const first = new Map<string, Text>();
  return named.flatMap((name) => {
    const earlier = first.get(name.text);
    if (earlier === undefined) {
      first.set(name.text, name);
      return [];
    }
    const label = { span: earlier.span, text: 'it is defined here first' };
    return [
      error('NAME_DUPLICATE', name.span, `\`${name.text}\` is defined twice`, {
        labels: [label],
        hints: ['give one of them another name'],
      }),
    ];
  });
}

function unknownSources({ sources, gases, lookups, inputs, conditions, sections }: SheetDocument): Diagnostic[] {
  const known = sources.map(({ id }) => id.text);
  const columns = conditions?.columns ?? [];
  const blocks = [
    ...gases,
    ...lookups,
    ...inputs,
    ...columns,
    ...sections.flatMap(({ steps, checks }) => [...steps, ...checks]),
  ];
  return blocks.flatMap(({ source }) => {
    if (source === undefined || known.includes(source.text)) return [];
    const near = nearest(source.text, known);
    const hint =
      near.length > 0
        ? `did you mean \`${near.join('`, `')}\`?`
        : `add it to \`sources\`: \`${source.text}: the document in full\``;
    return [error('SOURCE_UNKNOWN', source.span, `\`${source.text}\` is not listed in \`sources\``, { hints: [hint] })];
  });
}

function withoutOrigin({ inputs, conditions }: SheetDocument): Diagnostic[] {
  const columns = (conditions?.columns ?? []).filter(({ unit }) => unit?.text !== 'text');
  return [...inputs, ...columns]
    .filter(({ source, hold }) => source === undefined && hold === undefined)
    .map(({ name }) =>
      warning('SOURCE_MISSING', name.span, `the input \`${name.text}\` has neither a source nor a hold`, {
        hints: ['add `source:` with an id of `sources`, or `hold:` with what it waits for'],
      }),
    );
}
