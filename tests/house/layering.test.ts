import { join } from 'node:path';
import { ESLint } from 'eslint';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '../..');
// Type-aware rules need a file on disk; the layering rules do not, so the fixtures here are only text.
const eslint = new ESLint({
  cwd: root,
  overrideConfig: { languageOptions: { parserOptions: { projectService: false } } },
  ruleFilter: ({ ruleId }) => ruleId.startsWith('import-x/') || ruleId.startsWith('no-restricted'),
});

async function faults(path: string, code: string): Promise<(string | null)[]> {
  const [result] = await eslint.lintText(code, { filePath: join(root, path) });
  return result?.messages.map((message) => message.ruleId) ?? [];
}

const FORBIDDEN = [
  ['core/units/fixture.ts', "import '../../cli/main.ts';"],
  ['core/units/fixture.ts', "import '../sheet/document.ts';"],
  ['core/gas/fixture.ts', "import '../units/unit.ts';"],
  ['core/gas/fixture.ts', "import '../library/function.ts';"],
  ['core/seal/fixture.ts', "import '../../server/start.ts';"],
  ['core/report/fixture.ts', "import '../evaluate/evaluate-sheet.ts';"],
  ['server/fixture.ts', "import '../cli/main.ts';"],
  ['server/fixture.ts', "import '../web/report/report-view.tsx';"],
  ['web/fixture.ts', "import '../server/start.ts';"],
  ['web/report/fixture.ts', "import '../../schemas/api.ts';"],
  ['cli/fixture.ts', "import '../web/main.tsx';"],
  ['cli/fixture.ts', "import '../server/start.ts';"],
] as const;

const ALLOWED = [
  ['core/units/fixture.ts', "import '../diagnostics/diagnostic.ts';"],
  ['core/library/fixture.ts', "import '../gas/gas-model.ts';"],
  ['server/fixture.ts', "import '../core/report/model.ts';"],
  ['cli/fixture.ts', "import '../web/report/report-view.tsx';"],
] as const;

describe('the direction of dependence', () => {
  it.each(FORBIDDEN)('%s refuses %s', async (path, code) => {
    expect(await faults(path, code)).toContain('import-x/no-restricted-paths');
  });

  it.each(ALLOWED)('%s allows %s', async (path, code) => {
    expect(await faults(path, code)).not.toContain('import-x/no-restricted-paths');
  });
});

describe('the purity of core', () => {
  it.each([
    ["import { readFileSync } from 'node:fs'; readFileSync('x');", 'no-restricted-imports'],
    ['process.exit(1);', 'no-restricted-globals'],
    ['Math.random();', 'no-restricted-properties'],
    ['Math.pow(2, 3);', 'no-restricted-properties'],
    ['Date.now();', 'no-restricted-properties'],
    ['new Date();', 'no-restricted-syntax'],
  ])('refuses %s', async (code, rule) => {
    expect(await faults('core/units/fixture.ts', code)).toContain(rule);
  });
});
