import { describe, expect, it } from 'vitest';
import { DIAGNOSTIC_CODES } from '../../core/diagnostics/codes.ts';
import { makeWorkplace } from './harness.ts';

const place = makeWorkplace();

const WRONG = [
  'antinode: sheet/1',
  'number: T-1',
  'title: Wrong',
  'units: us',
  'inputs:',
  '  p: { value: 5 psj, hold: h }',
  '  q: { value: 5 psi }',
  '  p: { value: 6 psi, hold: h }',
].join('\n');

interface Sarif {
  readonly version: string;
  readonly runs: readonly [
    {
      readonly tool: { readonly driver: { readonly name: string; readonly rules: readonly { readonly id: string }[] } };
      readonly columnKind: string;
      readonly results: readonly {
        readonly ruleId: string;
        readonly ruleIndex: number;
        readonly level: string;
        readonly message: { readonly text: string };
        readonly locations: readonly { readonly physicalLocation: unknown }[];
        readonly relatedLocations?: readonly unknown[];
      }[];
    },
  ];
}

describe('lint for code review systems', () => {
  it('writes SARIF 2.1.0', async () => {
    await place.write('a b.yaml', WRONG);
    const { status, out, err } = await place.cli(['lint', 'a b.yaml', '--format', 'sarif']);
    expect([status, err]).toEqual([2, '']);
    const log = JSON.parse(out) as Sarif;
    const [run] = log.runs;
    // OASIS SARIF 2.1.0: 3.13.2 version, 3.14.17 columnKind, 3.19.23 rules, 3.27.5 ruleId, 3.27.6 ruleIndex, 3.27.10 level.
    expect(log.version).toBe('2.1.0');
    expect(run.columnKind).toBe('utf16CodeUnits');
    expect(run.tool.driver.rules.map(({ id }) => id)).toEqual(Object.keys(DIAGNOSTIC_CODES));
    for (const { ruleId, ruleIndex } of run.results) expect(run.tool.driver.rules[ruleIndex]?.id).toBe(ruleId);
    expect(run.results.map(({ ruleId, level }) => `${ruleId} ${level}`).toSorted()).toEqual([
      'SOURCE_MISSING warning',
      'UNIT_UNKNOWN error',
      'YAML_DUPLICATE_KEY error',
    ]);
    const unit = run.results.find(({ ruleId }) => ruleId === 'UNIT_UNKNOWN');
    expect(unit?.message.text).toContain('hint: did you mean');
    expect(unit?.locations[0]?.physicalLocation).toEqual({
      artifactLocation: { uri: 'a%20b.yaml' },
      region: { startLine: 6, startColumn: 17, endLine: 6, endColumn: 20 },
    });
    expect(run.results.find(({ ruleId }) => ruleId === 'YAML_DUPLICATE_KEY')?.relatedLocations).toHaveLength(1);
  });

  it('of a sheet without fault has no results', async () => {
    await place.write('a.yaml', WRONG.split('\n').slice(0, 4).join('\n'));
    const { status, out } = await place.cli(['lint', 'a.yaml', '--format', 'sarif']);
    expect(status).toBe(0);
    expect((JSON.parse(out) as Sarif).runs[0].results).toEqual([]);
  });
});

describe('lint for editors', () => {
  it('writes one line for each diagnostic', async () => {
    await place.write('a.yaml', WRONG);
    const { status, out, err } = await place.cli(['lint', 'a.yaml', '--format', 'short']);
    expect([status, err]).toEqual([2, '']);
    const lines = out.trimEnd().split('\n');
    expect(lines).toHaveLength(3);
    expect(lines).toContain('a.yaml:6:17: error[UNIT_UNKNOWN]: `psj` is not a unit');
    for (const line of lines) expect(line).toMatch(/^a\.yaml:\d+:\d+: (?:error|warning)\[[A-Z_]+\]: \S/);
  });
});
