import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';

const example = readFileSync(join(import.meta.dirname, '../../examples/tarn-hollow/discharge-run-force.yaml'), 'utf8');

const SCRAPS = ['\t', '{', '}', '[', ']', ':', '- ', '"', "'", '|', '&a ', '*a', '!x ', '#', '\n', '\n  ', '%', '1e999', '0/0', '^', '((', ' to ', 'K', 'psia', '<=', '\\', '$', '\u2028', '🜁', '__proto__: 1', 'e', '..']; // prettier-ignore

/** The example with a few cuts, copies and scraps: near enough to a sheet to get past the first checks. */
const mutated = fc
  .array(fc.tuple(fc.nat(example.length), fc.nat(40), fc.constantFrom('', ...SCRAPS)), { minLength: 1, maxLength: 4 })
  .map((edits) => edits.reduce((text, [at, cut, scrap]) => text.slice(0, at) + scrap + text.slice(at + cut), example));

it('whatever is done to a sheet, it gives a report or faults with a place, and never throws', () => {
  fc.assert(
    fc.property(mutated, (text) => {
      const { report, diagnostics } = evaluateSheet({ entry: 's.yaml', files: [{ name: 's.yaml', text }] });
      const errors = diagnostics.filter(({ severity }) => severity === 'error');
      expect(report === null).toBe(errors.length > 0);
      const lineCount = text.split('\n').length;
      for (const { file, line, column, length, message } of diagnostics) {
        expect(file).toBe('s.yaml');
        expect(line).toBeGreaterThanOrEqual(1);
        expect(line).toBeLessThanOrEqual(lineCount);
        expect(column).toBeGreaterThanOrEqual(1);
        expect(length).toBeGreaterThanOrEqual(1);
        expect(message).not.toBe('');
      }
    }),
    { numRuns: 500 },
  );
}, 60_000);
