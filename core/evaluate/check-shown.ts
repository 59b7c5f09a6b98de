import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import type { Shape } from '../axes/shape.ts';
import { sameShape } from '../axes/shape.ts';
import type { SheetDocument, TableNode, Text } from '../sheet/document.ts';
import { textValues } from '../sheet/text-values.ts';

/** Names that prose and tables show: each must stand for a quantity, and the columns of a table share one axis. */
export function checkShown(
  { sections }: SheetDocument,
  names: ReadonlySet<string>,
  faulty: ReadonlySet<string>,
  shapes: ReadonlyMap<string, Shape>,
): Diagnostic[] {
  const known = (name: string): boolean => names.has(name) || faulty.has(name);
  return sections.flatMap(({ text, tables }) => [
    ...(text === undefined ? [] : textFaults(text, known, names)),
    ...tables.flatMap((table) => tableFaults(table, known, names, shapes)),
  ]);
}

function textFaults(text: Text, known: (name: string) => boolean, names: ReadonlySet<string>): Diagnostic[] {
  return textValues(text.text).flatMap(({ name, start, end }) => {
    if (known(name)) return [];
    const { span } = text;
    const isPlain = span.end - span.start === text.text.length;
    const place = isPlain ? { ...span, start: span.start + start, end: span.start + end } : span;
    return [unknown(name, place, names)];
  });
}

function tableFaults(
  { of }: TableNode,
  known: (name: string) => boolean,
  names: ReadonlySet<string>,
  shapes: ReadonlyMap<string, Shape>,
): Diagnostic[] {
  const strangers = of.filter(({ text }) => !known(text)).map(({ text, span }) => unknown(text, span, names));
  const varying = of.filter(({ text }) => (shapes.get(text) ?? []).length > 0);
  const [first] = varying;
  const shape = (first && shapes.get(first.text)) ?? [];
  const misfits = varying.filter(({ text }) => {
    const own = shapes.get(text) ?? [];
    return own.length > 1 || !sameShape(own, shape);
  });
  return [
    ...strangers,
    ...misfits.map(({ text, span }) =>
      error(
        'FIGURE_AXES',
        span,
        `\`${text}\` varies along ${(shapes.get(text) ?? []).map((name) => `\`${name}\``).join(' and ')}`,
        {
          hints: [
            'the columns of a table vary along one and the same axis, or are single values; bring others down by `max_over(…)`',
          ],
        },
      ),
    ),
  ];
}

function unknown(name: string, span: Text['span'], names: ReadonlySet<string>): Diagnostic {
  const near = nearest(name, names, 3);
  const hints = near.length > 0 ? [`did you mean \`${near.join('`, `')}\`?`] : [];
  return error('NAME_UNKNOWN', span, `no quantity is named \`${name}\``, { hints });
}
