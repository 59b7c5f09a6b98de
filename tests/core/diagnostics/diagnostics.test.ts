import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DIAGNOSTIC_CODES } from '../../../core/diagnostics/codes.ts';
import { error } from '../../../core/diagnostics/diagnostic.ts';
import { locate, locateDiagnostic } from '../../../core/diagnostics/locate.ts';
import { editDistance, nearest } from '../../../core/diagnostics/nearest.ts';
import { renderDiagnostic, shortForm } from '../../../core/diagnostics/render.ts';

function located(text: string, start: number, end: number) {
  const diagnostic = error('UNIT_UNKNOWN', { file: 's.yaml', start, end }, 'unknown unit `psgi`', {
    hints: ['did you mean `psig`?'],
  });
  return locateDiagnostic(diagnostic, () => text);
}

describe('codes', () => {
  it('are each documented by one sentence', () => {
    for (const [code, sentence] of Object.entries(DIAGNOSTIC_CODES)) {
      expect(code).toMatch(/^[A-Z][A-Z0-9_]+$/);
      expect(sentence).toMatch(/^[A-Z].*\.$/);
    }
  });
});

describe('locate', () => {
  it.each([
    ['ab\ncd', 0, 1, 1],
    ['ab\ncd', 3, 2, 1],
    ['ab\ncd', 4, 2, 2],
    ['ab\r\ncd', 4, 2, 1],
    ['\uFEFFab', 1, 1, 1],
    ['ab', 99, 1, 3],
    ['', 0, 1, 1],
  ])('%j at %d is %d:%d', (text, offset, line, column) => {
    expect(locate(text, offset)).toEqual({ line, column });
  });

  it('never leaves the text', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 80 }), fc.integer({ min: -5, max: 100 }), (text, offset) => {
        const { line, column } = locate(text, offset);
        const lines = text.split('\n');
        expect(line).toBeLessThanOrEqual(lines.length);
        expect(column).toBeLessThanOrEqual((lines[line - 1] ?? '').length + 1);
      }),
    );
  });
});

describe('the form for people', () => {
  it('shows the line, underlines the fault, and ends with the hint', () => {
    const text = 'inputs:\n  p_d: 905 psgi\n';
    expect(renderDiagnostic(located(text, 19, 23))).toBe(
      [
        'error[UNIT_UNKNOWN]: unknown unit `psgi`',
        ' --> s.yaml:2:12',
        '  |',
        '2 |   p_d: 905 psgi',
        '  |            ^^^^',
        '  = hint: did you mean `psig`?',
      ].join('\n'),
    );
  });

  it('cuts a long line around the fault', () => {
    const text = `${'x'.repeat(3000)}psgi${'y'.repeat(3000)}`;
    const lines = renderDiagnostic(located(text, 3000, 3004)).split('\n');
    const [source = '', carets = ''] = lines.filter((line) => line.includes('psgi') || line.includes('^')).slice(-2);
    expect(source.length).toBeLessThan(130);
    expect(source.slice(carets.indexOf('^'), carets.lastIndexOf('^') + 1)).toBe('psgi');
  });

  it('sends no control character of a sheet to the terminal', () => {
    const text = 'a: \u001b[31mred\u0007';

    expect(renderDiagnostic(located(text, 3, 8))).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u007f]/);
  });

  it('has a short form for tools', () => {
    expect(shortForm(located('p_d: 905 psgi', 9, 13))).toBe('s.yaml:1:10: error[UNIT_UNKNOWN]: unknown unit `psgi`');
  });
});

describe('nearest', () => {
  const names = ['pressure', 'temperature', 'speed_of_sound', 'p_d', 'psig'];

  it.each([
    ['presure', ['pressure']],
    ['perssure', ['pressure']],
    ['speed_of_sond', ['speed_of_sound']],
    ['PSIG', ['psig']],
    ['p_s', ['p_d']],
    ['volume', []],
    ['x', []],
  ])('%s: %j', (word, expected) => {
    expect(nearest(word, names)).toEqual(expected);
  });

  it('measures a distance: zero to itself, the same both ways, one for one slip', () => {
    const word = fc.string({ minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(word, word, fc.nat(12), (a, b, at) => {
        expect(editDistance(a, a)).toBe(0);
        expect(editDistance(a, b)).toBe(editDistance(b, a));
        const cut = a.slice(0, at % a.length) + a.slice((at % a.length) + 1);
        expect(editDistance(a, cut)).toBe(1);
      }),
    );
  });
});
