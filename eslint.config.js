import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import importX from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/**
 * The direction of dependence (DEVELOPERS.md, "Map"). `only` lists what a folder may import of the project; all the
 * rest is refused. Kept as data so that a reader sees the whole graph at once and the layering test can walk it.
 */
export const LAYERS = {
  'core/diagnostics': ['core/diagnostics'],
  'core/numeric': ['core/numeric'],
  'core/units': ['core/units', 'core/diagnostics', 'core/numeric'],
  'core/axes': ['core/axes', 'core/units', 'core/numeric'],
  'core/limits': ['core/limits', 'core/numeric'],
  'core/mechanics': ['core/mechanics', 'core/numeric'],
  'core/gas': ['core/gas', 'core/numeric'],
  'core/machine': ['core/machine', 'core/gas', 'core/mechanics', 'core/limits', 'core/numeric'],
  'core/acoustics': ['core/acoustics', 'core/machine', 'core/gas', 'core/mechanics', 'core/limits', 'core/numeric'],
  'core/library': [
    'core/library',
    'core/acoustics',
    'core/machine',
    'core/gas',
    'core/mechanics',
    'core/limits',
    'core/axes',
    'core/units',
    'core/diagnostics',
    'core/numeric',
  ],
  'core/expression': [
    'core/expression',
    'core/axes',
    'core/units',
    'core/diagnostics',
    'core/numeric',
    'core/library/function.ts',
    'core/gas/gas-model.ts',
  ],
  'core/sheet': ['core/sheet', 'core/diagnostics'],
  'core/report': [
    'core/report',
    'core/axes',
    'core/expression',
    'core/sheet',
    'core/units',
    'core/diagnostics',
    'core/library/function.ts',
    'core/gas/gas-model.ts',
    'core/numeric',
    'core/seal/digest.ts',
    'core/version.ts',
  ],
  'core/seal': ['core/seal', 'core/report'],
  'core/evaluate': ['core'],
  schemas: ['schemas', 'core/report', 'core/seal'],
  cli: ['cli', 'core', 'schemas', 'web/report'],
  server: ['server', 'core', 'schemas'],
  'web/report': ['web/report', 'core'],
  'web/lib': ['web/lib', 'core', 'schemas'],
  'web/ui': ['web/ui', 'web/lib', 'core', 'schemas'],
  web: ['web', 'core', 'schemas'],
};

/** A zone of import-x names what is refused: for each folder all of the project, except what LAYERS allows. */
const layerZones = Object.entries(LAYERS).map(([folder, only]) => ({
  target: `./${folder}`,
  from: '.',
  except: [...only.map((path) => `./${path}`), './node_modules'],
  message: `${folder} may import only: ${only.join(', ')}.`,
}));

const TRANSCENDENTAL = [
  'pow', 'exp', 'expm1', 'log', 'log10', 'log1p', 'log2', 'sin', 'cos', 'tan', 'asin', 'acos', 'atan', 'atan2',
  'sinh', 'cosh', 'tanh', 'asinh', 'acosh', 'atanh', 'cbrt', 'hypot',
]; // prettier-ignore

const NOT_IN_CORE = [
  'process',
  'window',
  'document',
  'navigator',
  'fetch',
  'setTimeout',
  'setInterval',
  'console',
  'require',
];

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**', 'data/**', '**/generated/**', 'tests/fixtures/**'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: {
      parserOptions: {
        projectService: { allowDefaultProject: ['*.js'] },
        tsconfigRootDir: import.meta.dirname,
      },
    },
    plugins: { 'import-x': importX },
    settings: { 'import-x/resolver-next': [createTypeScriptImportResolver({ project: 'tsconfig.json' })] },
    rules: {
      '@typescript-eslint/no-floating-promises': ['error', { checkThenables: true }],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      eqeqeq: 'error',
      'no-console': 'error',
      'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }],
      'import-x/no-cycle': 'error',
      'import-x/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones: layerZones }],
    },
  },
  {
    files: ['core/**/*.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            { group: ['node:*', 'react', 'express', 'drizzle-orm*'], message: 'core is pure: it runs everywhere.' },
          ],
        },
      ],
      'no-restricted-globals': [
        'error',
        ...NOT_IN_CORE.map((name) => ({ name, message: 'core is pure: hosts pass such things in.' })),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'core has no randomness.' },
        { object: 'Date', property: 'now', message: 'core has no clock.' },
        ...TRANSCENDENTAL.map((property) => ({ object: 'Math', property, message: 'Use core/numeric/math.ts.' })),
      ],
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date']", message: 'core has no clock.' },
      ],
    },
  },
  { files: ['core/numeric/math.ts'], rules: { 'no-restricted-properties': 'off' } },
  {
    files: ['web/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': reactHooks },
    rules: { ...reactHooks.configs.recommended.rules },
  },
  { files: ['.build/**', 'tests/bench/**', 'server/main.ts', 'server/start.ts'], rules: { 'no-console': 'off' } },
  { files: ['eslint.config.js'], ...tseslint.configs.disableTypeChecked },
);
