import { describe, expect, it } from 'vitest';
import { evaluateText, places, reportOf, sheetOf } from './sheet-text.ts';

const DIGEST = `sha256-${'a'.repeat(64)}`;
const SHEET = sheetOf(
  'take: { T_d: { from: TH3-C-102@0#T_d, label: Discharge temperature } }',
  'sections: [{ title: S, steps: { T: T_d to degC } }]',
);

const temperature = { unit: 'degF', si: 400, axes: [] };

function lock(quantities: unknown, more: object = {}): Record<string, string> {
  const revisions = { 'TH3-C-102@0': { digest: DIGEST, quantities, ...more } };
  return { 'antinode.lock.json': JSON.stringify({ antinode: 'lock/1', revisions }) };
}

describe('a value taken from a revision', () => {
  it('is that of the lock file, and says where it is from', () => {
    const report = reportOf(evaluateText(SHEET, {}, lock({ T_d: temperature })));
    expect(report.quantities['T']?.value).toBeCloseTo(126.85, 10);
    const block = report.sections.flatMap(({ blocks }) => blocks).find(({ path }) => path === 'taken/T_d');
    // 400 K are 720 °R, and 260.33 °F.
    expect(block).toMatchObject({
      from: 'TH3-C-102@0#T_d',
      revision: DIGEST,
      printed: { number: '260.3', unit: 'degF' },
    });
  });

  it('changes the digest of what rests on it when its revision does', () => {
    const digestOf = (digest: string): string | undefined =>
      reportOf(evaluateText(SHEET, {}, lock({ T_d: temperature }, { digest }))).quantities['T']?.digest;
    expect(digestOf(DIGEST)).not.toBe(digestOf(`sha256-${'b'.repeat(64)}`));
  });

  it('warns when a later revision is issued', () => {
    const evaluation = evaluateText(SHEET, {}, lock({ T_d: temperature }, { newest: '1' }));
    expect(evaluation.report).not.toBeNull();
    expect(evaluation.diagnostics).toMatchObject([
      { code: 'TAKE_STALE', severity: 'warning', message: '`TH3-C-102@0` is superseded: revision 1 is issued' },
    ]);
  });

  it('may vary along the conditions of the sheet', () => {
    const text = `${SHEET}\nconditions: { source: b, columns: { q: psi }, rows: { C1: [1], C2: [2] } }`;
    const axes = (...values: readonly string[]): unknown => [{ name: 'condition', values }];
    const found = reportOf(
      evaluateText(text, {}, lock({ T_d: { unit: 'degC', si: [300, 310], axes: axes('C1', 'C2') } })),
    );
    expect(found.quantities['T']?.axes).toEqual([{ name: 'condition', values: ['C1', 'C2'] }]);
    expect(
      places(evaluateText(text, {}, lock({ T_d: { unit: 'degC', si: [300, 310], axes: axes('C1', 'C9') } }))),
    ).toEqual(['AXIS_CONFLICT 7:22']);
  });
});

describe('what cannot be taken', () => {
  it.each([
    ['without a lock file', {}, 'fetch it: `antinode pull TH3-C-102@0`'],
    [
      'of a revision that is not locked',
      { 'antinode.lock.json': '{ "antinode": "lock/1", "revisions": {} }' },
      'antinode pull',
    ],
    ['of a name that the revision has not', lock({ T_s: temperature }), 'did you mean `T_s`?'],
    ['from a file that is no lock file', { 'antinode.lock.json': 'none' }, 'write it anew'],
    ['from a lock without a digest', lock({ T_d: temperature }, { digest: '' }), 'write it anew'],
    ['whose values do not fit their axes', lock({ T_d: { unit: 'degC', si: [1, 2], axes: [] } }), 'write it anew'],
    ['in a unit that is not known', lock({ T_d: { unit: 'degX', si: 1, axes: [] } }), ''],
    [
      'along an axis that is not known',
      lock({ T_d: { unit: 'degC', si: [1], axes: [{ name: 'mood', values: ['a'] }] } }),
      '',
    ],
    [
      'along an axis in a gauge unit',
      lock({ T_d: { unit: 'degC', si: [1], axes: [{ name: 'speed', values: [1], unit: 'psig' }] } }),
      '',
    ],
  ])('%s', (_, beside, hint) => {
    const { report, diagnostics } = evaluateText(SHEET, {}, beside);
    expect(report).toBeNull();
    expect(diagnostics[0]).toMatchObject({ severity: 'error', line: 7 });
    expect(diagnostics[0]?.hints.join()).toContain(hint);
  });

  it.each(['TH3-C-102#T_d', 'TH3-C-102@0', 'T d@0#x'])('%s names nothing', (from) => {
    const { diagnostics } = evaluateText(sheetOf(`take: { T_d: "${from}" }`));
    expect(diagnostics).toMatchObject([{ code: 'SCHEMA_VALUE', line: 7 }]);
  });
});
