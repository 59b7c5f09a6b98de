import { error, type Diagnostic, type Span } from '../diagnostics/diagnostic.ts';
import { nearest } from '../diagnostics/nearest.ts';
import { annotations } from './annotations.ts';
import type { ConditionColumnNode, ConditionsNode, Text } from './document.ts';
import { at, itemsOf, pairsOf, textAt, textOf } from './entries.ts';
import { nameBeside } from './file-names.ts';
import { readCsv } from './read-csv.ts';
import type { Entry } from './read-yaml.ts';

/** Where the text of a file beside the sheet comes from. */
export type ReadFile = (name: string) => string | undefined;

type Column = Omit<ConditionColumnNode, 'cells'>;

interface Row {
  readonly id: Text;
  readonly cells: readonly (Text | undefined)[];
}

/** Brings operating conditions, written in the sheet or in a CSV file beside it, into columns of one cell for each id. */
export class ConditionsReader {
  readonly diagnostics: Diagnostic[] = [];
  private readonly file: string;
  private readonly readFile: ReadFile;

  constructor(file: string, readFile: ReadFile) {
    this.file = file;
    this.readFile = readFile;
  }

  read(entry: Entry, keySpan: Span): ConditionsNode | undefined {
    // What is neither a mapping nor the name of a file has been reported by the schema.
    if (entry.entry !== 'map' && textOf(entry) === undefined) return undefined;
    const file = entry.entry === 'scalar' ? textOf(entry) : textAt(entry, 'file');
    const rows = at(entry, 'rows');
    if (file !== undefined && rows !== undefined) {
      this.report('SCHEMA_VALUE', file.span, 'the conditions stand in a file, and in rows as well', [
        'keep one of the two',
      ]);
      return undefined;
    }
    if (file !== undefined) return this.fromFile(file, entry);
    if (rows !== undefined) return this.fromRows(entry, rows);
    this.report('SCHEMA_MISSING_KEY', keySpan, 'the conditions have neither `rows` nor a `file`', [
      'such as `rows: { C01: { p_s: 120 psig } }`, or `file: conditions.csv`',
    ]);
    return undefined;
  }

  private fromRows(entry: Entry, rows: Entry): ConditionsNode | undefined {
    const declared = this.columns(entry);
    const names = new Map(declared.map((column) => [column.name.text, column]));
    for (const { value } of pairsOf(rows)) {
      for (const { key } of pairsOf(value)) {
        if (!names.has(key.text)) names.set(key.text, { ...shared(entry), name: key });
      }
    }
    const columns = [...names.values()];
    const read = pairsOf(rows).map(({ key, value }) => ({ id: key, cells: this.cells(key, value, columns) }));
    return this.complete(read, columns);
  }

  private cells(id: Text, row: Entry, columns: readonly Column[]): (Text | undefined)[] {
    if (row.entry === 'map') return columns.map(({ name }) => textAt(row, name.text));
    const items = itemsOf(row).map(textOf);
    if (row.entry === 'list' && items.length !== columns.length) {
      const message = `the row \`${id.text}\` has ${items.length} cells, and there are ${columns.length} columns`;
      const hint =
        columns.length === 0
          ? 'name the columns and their units under `columns`'
          : `its cells are ${columns.map(({ name }) => name.text).join(', ')}`;
      this.report('CONDITIONS', id.span, message, [hint]);
      return columns.map(() => undefined);
    }
    return items;
  }

  private fromFile(named: Text, entry: Entry): ConditionsNode | undefined {
    const name = nameBeside(this.file, named.text);
    const text = name === null ? undefined : this.readFile(name);
    if (name === null || text === undefined) {
      this.report('FILE_NOT_FOUND', named.span, `there is no file \`${named.text}\` beside the sheet`, [
        'name it as seen from the sheet, without `..`',
      ]);
      return undefined;
    }
    const { rows, diagnostics } = readCsv(name, text);
    this.diagnostics.push(...diagnostics);
    const [header, ...body] = rows;
    if (header === undefined || body.length === 0) {
      this.report('CONDITIONS', { file: name, start: 0, end: 0 }, 'the file has no rows', [
        'its first line is a header such as `id, p_s [psig], T_s [degF]`',
      ]);
      return undefined;
    }
    const declared = new Map(this.columns(entry).map((column) => [column.name.text, column]));
    const columns = header.slice(1).flatMap((cell) => this.headed(cell, entry, declared) ?? []);
    this.undeclared(declared, columns);
    if (columns.length < header.length - 1) return undefined;
    return this.complete(
      body.map((row) => ({ id: row[0] ?? named, cells: this.csvCells(row, columns) })),
      columns,
    );
  }

  /** A header cell: `p_s [psig]`. */
  private headed(cell: Text, entry: Entry, declared: ReadonlyMap<string, Column>): Column | undefined {
    const match = /^([A-Za-z][A-Za-z0-9_]*)\s*(?:\[\s*(.*?)\s*\])?$/.exec(cell.text);
    const name = match?.[1];
    if (name === undefined) {
      this.report('CONDITIONS', cell.span, `\`${cell.text}\` is no header of a column`, [
        'write a name and, in square brackets, its unit: `p_s [psig]`, `gas [gas]`, `loading [text]`',
      ]);
      return undefined;
    }
    const { span } = cell;
    const written = match?.[2];
    const unitStart = span.start + cell.text.indexOf('[') + 1;
    const unit =
      written === undefined
        ? undefined
        : { text: written, span: { ...span, start: unitStart, end: unitStart + written.length } };
    const known = declared.get(name);
    return {
      ...(known ?? shared(entry)),
      name: { text: name, span: { ...span, end: span.start + name.length } },
      ...(unit === undefined ? {} : { unit }),
    };
  }

  private undeclared(declared: ReadonlyMap<string, Column>, columns: readonly Column[]): void {
    const names = columns.map(({ name }) => name.text);
    for (const { name } of declared.values()) {
      if (names.includes(name.text)) continue;
      const near = nearest(name.text, names, 2);
      this.report('CONDITIONS', name.span, `the file has no column \`${name.text}\``, [
        near.length > 0 ? `did you mean \`${near.join('`, `')}\`?` : `its columns are ${names.join(', ')}`,
      ]);
    }
  }

  private csvCells(row: readonly Text[], columns: readonly Column[]): (Text | undefined)[] {
    const [id, ...cells] = row;
    if (cells.length > columns.length && id !== undefined)
      this.report('CONDITIONS', id.span, `the row has ${cells.length} cells, and there are ${columns.length} columns`, [
        'a cell with a comma stands between quotation marks',
      ]);
    return columns.map((_, i) => (cells[i]?.text === '' ? undefined : cells[i]));
  }

  private columns(entry: Entry): Column[] {
    return pairsOf(at(entry, 'columns')).map(({ key, value }) => {
      const unit = value.entry === 'scalar' ? textOf(value) : textAt(value, 'unit');
      const hold = textAt(value, 'hold');
      return {
        ...shared(entry),
        ...annotations(value),
        name: key,
        ...(unit === undefined ? {} : { unit }),
        ...(hold === undefined ? {} : { hold }),
      };
    });
  }

  /** Turns rows into columns. Every condition has a value in every column. */
  private complete(rows: readonly Row[], columns: readonly Column[]): ConditionsNode | undefined {
    const seen = new Map<string, Text>();
    for (const { id, cells } of rows) {
      const earlier = seen.get(id.text);
      if (earlier !== undefined)
        this.report('CONDITIONS', id.span, `the condition \`${id.text}\` stands twice`, ['give each its own id']);
      seen.set(id.text, id);
      columns.forEach(({ name }, i) => {
        if (cells[i] === undefined)
          this.report('CONDITIONS', id.span, `the condition \`${id.text}\` has no value for \`${name.text}\``, [
            'every condition has a value in every column',
          ]);
      });
    }
    if (columns.length === 0 || this.diagnostics.some(({ severity }) => severity === 'error')) return undefined;
    return {
      ids: rows.map(({ id }) => id),
      columns: columns.map((column, i) => ({ ...column, cells: rows.flatMap(({ cells }) => cells[i] ?? []) })),
    };
  }

  private report(code: Diagnostic['code'], span: Span, message: string, hints: readonly string[]): void {
    this.diagnostics.push(error(code, span, message, { hints }));
  }
}

/** The source of all columns, where they have none of their own. */
function shared(entry: Entry): Pick<Column, 'source'> {
  const source = textAt(entry, 'source');
  return source === undefined ? {} : { source };
}
