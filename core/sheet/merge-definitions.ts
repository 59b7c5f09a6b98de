import { error, type Diagnostic } from '../diagnostics/diagnostic.ts';
import type { SheetDocument, Text } from './document.ts';

/** What a document may state once only. */
const SINGLE = ['atmosphere', 'normal', 'standard'] as const;

const KEYS: Readonly<Record<(typeof SINGLE)[number], string>> = {
  atmosphere: 'atmosphere',
  normal: 'normal_state',
  standard: 'standard_state',
};

/**
 * Puts the definitions of used files before those of the sheet. What may stand once only is at fault where it stands
 * twice, even with the same value: one of the two would be changed one day, and not the other.
 */
export function mergeDefinitions(
  sheet: SheetDocument,
  used: readonly SheetDocument[],
): { readonly document: SheetDocument; readonly diagnostics: readonly Diagnostic[] } {
  const diagnostics: Diagnostic[] = [];
  const all = [...used, sheet];
  const one = <T>(
    pick: (document: SheetDocument) => T | undefined,
    placeOf: (value: T) => Text,
    key: string,
  ): T | undefined => {
    const [first, ...others] = all.flatMap((document) => pick(document) ?? []);
    for (const other of others) if (first !== undefined) diagnostics.push(twice(key, placeOf(other), placeOf(first)));
    return first;
  };
  const singles = Object.fromEntries(
    SINGLE.flatMap((key) => {
      const value = one(
        (document) => document[key],
        (text) => text,
        KEYS[key],
      );
      return value === undefined ? [] : [[key, value]];
    }),
  );
  const conditions = one(
    (document) => document.conditions,
    ({ ids, columns }) => ids[0] ?? columns[0]?.name ?? sheet.number,
    'conditions',
  );
  const document: SheetDocument = {
    ...sheet,
    ...singles,
    ...(conditions === undefined ? {} : { conditions }),
    sources: all.flatMap(({ sources }) => sources),
    assumptions: all.flatMap(({ assumptions }) => assumptions),
    exclusions: all.flatMap(({ exclusions }) => exclusions),
    references: all.flatMap(({ references }) => references),
    lookups: all.flatMap(({ lookups }) => lookups),
    gases: all.flatMap(({ gases }) => gases),
    inputs: all.flatMap(({ inputs }) => inputs),
    unread: all.flatMap(({ unread }) => unread),
  };
  return { document, diagnostics };
}

function twice(key: string, at: Text, first: Text): Diagnostic {
  return error('NAME_DUPLICATE', at.span, `\`${key}\` is stated twice`, {
    labels: [{ span: first.span, text: 'it is stated here first' }],
    hints: ['keep one of the two'],
  });
}
