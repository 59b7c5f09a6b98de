import { describe, expect, it } from 'vitest';
import { locateDiagnostic } from '../../../core/diagnostics/locate.ts';
import { parseSheet } from '../../../core/sheet/parse-sheet.ts';

const HEAD = ['antinode: sheet/1', 'number: T-1', 'title: Test', 'units: us'];

function lines(...rest: string[]): string {
  return [...HEAD, ...rest, ''].join('\n');
}

/** Faults as `CODE line:column hint`. */
function faults(text: string): string[] {
  return parseSheet('s.yaml', text).diagnostics.map((diagnostic) => {
    const { code, line, column, hints } = locateDiagnostic(diagnostic, () => text);
    return `${code} ${line}:${column} ${hints[0] ?? ''}`.trim();
  });
}

describe('a sheet that is right', () => {
  const text = lines(
    'atmosphere: 13.9 psia # yearly mean',
    'sources: { basis: Design basis }',
    'assumptions: [The run is straight]',
    'gases:',
    '  residue: { method: ideal, fractions: { methane: 95 %, ethane: 0.05 } }',
    'inputs:',
    '  p_d: { value: 905 psig, label: "Discharge, pressure", source: basis, digits: 3 }',
    "  k: { value: 1.50, hold: 'Awaiting the vendor' }",
    'sections:',
    '  - title: Force',
    '    text: |',
    '      The run sees',
    '      $F$.',
    '    steps:',
    '      A: pi/4 * D_i^2 to in^2',
    '      D_i: { calc: "pipe_bore(6, \'Sch 80\')", unit: in }',
    '    checks:',
    '      - { that: A <= 30 in^2, label: Area }',
  );
  const { value, diagnostics } = parseSheet('s.yaml', text);

  it('becomes a document in its one explicit form', () => {
    expect(diagnostics).toEqual([]);
    expect(
      value?.inputs.map(({ name, value: typed, digits, hold }) => [name.text, typed.text, digits, hold?.text]),
    ).toEqual([
      ['p_d', '905 psig', 3, undefined],
      ['k', '1.50', undefined, 'Awaiting the vendor'],
    ]);
    expect(value?.sections[0]?.steps.map(({ name, calc, unit }) => [name.text, calc.text, unit?.text])).toEqual([
      ['A', 'pi/4 * D_i^2 to in^2', undefined],
      ['D_i', "pipe_bore(6, 'Sch 80')", 'in'],
    ]);
    expect(value?.gases[0]?.fractions.map(({ component, amount }) => `${component.text} ${amount.text}`)).toEqual([
      'methane 95 %',
      'ethane 0.05',
    ]);
    expect(value?.sections[0]?.text?.text).toBe('The run sees\n$F$.\n');
  });

  it('has every plain and quoted text at its place in the file', () => {
    const steps = value?.sections[0]?.steps ?? [];
    const inputs = value?.inputs ?? [];
    const texts = [
      ...steps.flatMap(({ name, calc }) => [name, calc]),
      ...inputs.flatMap(({ name, value: typed, label, hold }) => [name, typed, label, hold]),
      value?.atmosphere,
      value?.assumptions[0],
      value?.sections[0]?.checks[0]?.that,
    ].flatMap((found) => found ?? []);
    expect(texts.length).toBeGreaterThan(10);
    for (const { text: written, span } of texts) expect(text.slice(span.start, span.end)).toBe(written);
  });

  it('may begin with a byte-order mark, and end its lines as Windows does', () => {
    expect(parseSheet('s.yaml', `\uFEFF${text}`).diagnostics).toEqual([]);
    expect(parseSheet('s.yaml', text.replaceAll('\n', '\r\n')).diagnostics).toEqual([]);
  });
});

describe('text that is no YAML', () => {
  it.each([
    ['a tab', lines('inputs:', '\tp: 1 psi'), /^YAML_TAB 6:1 indent with spaces/],
    ['a tab deeper', lines('inputs:', '  p: 1 psi', '\tq: 1 psi'), /^YAML_TAB 7:1 indent with spaces/],
    [
      'a wrong indent',
      lines('inputs:', '  p: { value: 1 psi, hold: x }', '   q: { value: 1 psi, hold: x }'),
      /^YAML_SYNTAX 7:\d+ .+/,
    ],
    ['an unclosed quote', lines('sources: { a: "b }'), /^YAML_SYNTAX \d+:\d+ .+/],
    ['an unclosed bracket', lines('sources: { a: b'), /^YAML_SYNTAX \d+:\d+ .+/],
    ['a value with a colon', lines('assumptions:', '  - a: b: c'), /^YAML_SYNTAX 6:\d+ .+/],
    ['two documents', `${lines()}---\na: b\n`, /^YAML_SYNTAX 5:1 a sheet is one document/],
    ['a control character', lines('assumptions: [a\u001bb]'), /^YAML_SYNTAX 5:16 remove it/],
    ['a bad escape', lines('title2: "\\Delta"'), /^YAML_SYNTAX 5:\d+ use single quotes/],
    ['nothing', '', /^SCHEMA_TYPE 1:1 begin with/],
    ['a list', '- a\n- b\n', /^SCHEMA_TYPE 1:1 begin with/],
  ])('%s', (_, text, expected) => {
    expect(faults(text)[0]).toMatch(expected);
  });

  it('shows both places of a duplicate key', () => {
    const text = lines(
      'sources: { b: Basis }',
      'inputs:',
      '  p: { value: 1 psi, source: b }',
      '  p: { value: 2 psi, source: b }',
    );
    const [fault] = parseSheet('s.yaml', text).diagnostics;
    expect(faults(text)).toEqual(['YAML_DUPLICATE_KEY 8:3 remove one of them']);
    expect(fault?.labels[0]?.span.start).toBe(text.indexOf('  p:') + 2);
  });
});

describe('what a sheet may not be', () => {
  const BOMB = [
    'a: &a [x, x]',
    ...'bcdefghij'.split('').map((key, i) => `${key}: &${key} [*${'abcdefghi'[i]}, *${'abcdefghi'[i]}]`),
  ];

  it.each([
    ['an alias bomb', lines(...BOMB), /^YAML_ALIAS 5:\d+ write the value where it is used/],
    ['one alias', lines('assumptions: [&a one, *a]'), /^YAML_ALIAS 5:\d+ /],
    ['5 MB', `${lines()}# ${'x'.repeat(5_000_000)}`, /^FILE_TOO_LARGE 1:1 split the sheet/],
    ['10,000 brackets', lines(`assumptions: ${'['.repeat(10_000)}`), /^YAML_TOO_DEEP 5:\d+/],
    ['10,000 mappings', lines('a:', ...Array.from({ length: 10_000 }, (_, i) => `${' '.repeat(i % 40)}b:`)), /^YAML_/],
    ['10,000 dashes', `${'- '.repeat(10_000)}x\n`, /^YAML_/],
    ['60,000 values', lines(`assumptions: [${'a, '.repeat(60_000)}]`), /^LIMIT_EXCEEDED/],
  ])('%s', (_, text, expected) => {
    expect(faults(text)[0]).toMatch(expected);
  });
});

describe('what the schema refuses', () => {
  const withInput = (entry: string): string => lines('sources: { b: Basis }', 'inputs:', `  p: ${entry}`);

  it.each([
    ['an unknown key', lines('atmosfere: 14.7 psia'), 'SCHEMA_UNKNOWN_KEY 5:1 did you mean `atmosphere`?'],
    [
      'an unknown key of an input',
      withInput('{ valeu: 1 psi, value: 1 psi, source: b }'),
      'SCHEMA_UNKNOWN_KEY 7:8 did you mean `value`?',
    ],
    [
      'a key of a later version',
      lines('machine: []'),
      'SCHEMA_UNKNOWN_KEY 5:1 `machine` is not offered in this version',
    ],
    ['a missing key', withInput('{ source: b }'), 'SCHEMA_MISSING_KEY 7:3 such as `value: 905 psig`'],
    ['another unit system', lines().replace('units: us', 'units: uk'), 'SCHEMA_VALUE 4:8 did you mean `us`?'],
    ['another format', lines().replace('sheet/1', 'sheet/9'), 'SCHEMA_VALUE 1:11 did you mean `sheet/1`?'],
    ['a list for a mapping', lines('inputs: [a]'), /^SCHEMA_TYPE 5:1 such as/],
    ['a mapping for a text', lines('assumptions: [{ a: b }]'), /^SCHEMA_TYPE 5:\d+/],
    [
      'a number for a text',
      lines().replace('number: T-1', 'number: 104'),
      'SCHEMA_TYPE 2:9 put it in quotes if it is meant as text: `"104"`',
    ],
    ['an empty value', lines('title2:').replace('title2', 'atmosphere'), /^SCHEMA_TYPE 5:1 such as/],
    ['a truth value for a quantity', withInput('{ value: true, source: b }'), /^SCHEMA_TYPE 7:15/],
    ['a blank text', lines('assumptions: ["  "]'), /^SCHEMA_VALUE 5:\d+/],
    [
      'a bad name',
      lines('inputs:', '  p-d: { value: 1 psi, hold: x }'),
      /^SCHEMA_VALUE 6:3 a name starts with a letter/,
    ],
    ['too many digits', withInput('{ value: 1 psi, source: b, digits: 99 }'), /^SCHEMA_VALUE 7:41/],
    ['digits that are no whole number', withInput('{ value: 1 psi, source: b, digits: 2.5 }'), /^SCHEMA_TYPE 7:41/],
  ])('%s', (_, text, expected) => {
    const [fault, ...others] = faults(text);
    if (typeof expected === 'string') expect(fault).toBe(expected);
    else expect(fault).toMatch(expected);
    expect(others).toEqual([]);
  });

  it('names a missing key of the sheet itself', () => {
    expect(faults('number: T-1\ntitle: Test\nunits: us\n')).toEqual([
      'SCHEMA_MISSING_KEY 1:1 such as `antinode: sheet/1`',
    ]);
  });

  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty'])('is not fooled by the key %s', (key) => {
    expect(faults(lines(`${key}: 1`))[0]).toMatch(/^SCHEMA_UNKNOWN_KEY 5:1/);
    expect(faults(lines('inputs:', `  ${key}: { value: 1 psi, hold: x }`)).join()).toBe(
      key === '__proto__'
        ? 'SCHEMA_VALUE 6:3 a name starts with a letter, and goes on with letters, digits and `_`'
        : '',
    );
  });

  it('still reads the rest, so that its faults are found in the same run', () => {
    const { value } = parseSheet(
      's.yaml',
      lines('inputs:', '  p: { label: no value }', '  q: { value: 1 psi, hold: x }'),
    );
    expect(value?.inputs.map(({ name }) => name.text)).toEqual(['q']);
    expect(value?.unread.map(({ text }) => text)).toEqual(['p']);
  });
});

describe('scalars that are traps', () => {
  const input = (typed: string): string => lines('inputs:', `  x: { value: ${typed}, hold: x }`);

  it.each(['1e999', '61e9540', '.inf', '-.inf', '.nan'])('%s is refused at its place', (typed) => {
    expect(faults(input(typed))[0]).toMatch(/^NUMBER_NOT_FINITE 6:15/);
  });

  it.each(['1.50', '007', '12345678901234567890', '0x1F', '1_000', '1e3'])('%s keeps its spelling', (typed) => {
    expect(parseSheet('s.yaml', input(typed)).value?.inputs[0]?.value.text).toBe(typed);
  });
});

describe('names and sources', () => {
  it.each([
    [
      'a source that is not listed',
      lines('sources: { basis: B }', 'inputs:', '  p: { value: 1 psi, source: basys }'),
      'SOURCE_UNKNOWN 7:30 did you mean `basis`?',
    ],
    ['an input without origin', lines('inputs:', '  p: 1 psi'), /^SOURCE_MISSING 6:3 add `source:`/],
    [
      'a name that is defined twice',
      lines('inputs:', '  A: { value: 1 m^2, hold: x }', 'sections:', '  - title: T', '    steps:', '      A: 2'),
      /^NAME_DUPLICATE 10:7/,
    ],
  ])('%s', (_, text, expected) => {
    const [fault, ...others] = faults(text);
    if (typeof expected === 'string') expect(fault).toBe(expected);
    else expect(fault).toMatch(expected);
    expect(others).toEqual([]);
  });
});
